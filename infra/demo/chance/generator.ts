/**
 * Numbers that look drawn and are the same at every run: xorshift with the shifts 13, 17, 5 (Marsaglia, "Xorshift RNGs",
 * 2003), seeded by the FNV-1a hash of a text. A stream has a name, so that a new draw in one place moves nothing in
 * another. For invented history only.
 */
export class Generator {
  private state: number;

  constructor(private readonly name: string) {
    this.state = hashOf(name) || 1;
  }

  /** A stream of its own below this one. */
  stream(name: string): Generator {
    return new Generator(`${this.name}/${name}`);
  }

  /** From 0 up to 1, 1 not included. */
  fraction(): number {
    let x = this.state;
    x ^= x << 13;
    x ^= x >>> 17;
    x ^= x << 5;
    this.state = x >>> 0;
    return this.state / 2 ** 32;
  }

  /** A whole number, both ends included. */
  whole(from: number, to: number): number {
    return from + Math.floor(this.fraction() * (to - from + 1));
  }

  /** Around a middle, at most `spread` away and more often near it: the mean of two draws. */
  around(middle: number, spread: number): number {
    return middle + spread * (this.fraction() + this.fraction() - 1);
  }

  chance(share: number): boolean {
    return this.fraction() < share;
  }

  pick<Item>(items: readonly Item[]): Item {
    const item = items[Math.floor(this.fraction() * items.length)];
    if (item === undefined) throw new RangeError('There is nothing to choose from.');
    return item;
  }
}

function hashOf(text: string): number {
  let hash = 0x811c9dc5;
  for (const byte of Buffer.from(text, 'utf8')) hash = Math.imul(hash ^ byte, 0x01000193) >>> 0;
  return hash;
}
