let made = 0;

/** Ids in the shape of a UUIDv7, one after the other, so that a failing test says the same twice. */
export function nextId(): string {
  made += 1;
  return `01940000-0000-7000-8000-${made.toString(16).padStart(12, '0')}`;
}

/** The next number of a kind of document, apart from ids, so that both read well in a failing test. */
const numbers = new Map<string, number>();
export function nextNumber(kind: string, first: number): number {
  const number = (numbers.get(kind) ?? first - 1) + 1;
  numbers.set(kind, number);
  return number;
}

/** Starts again from the beginning, for a test that compares whole texts. */
export function restartIds(): void {
  made = 0;
  numbers.clear();
}

/** When everything that is built was made. */
export const MADE_AT = '2027-01-11T15:00:00.000Z';
