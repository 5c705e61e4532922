import { invalid } from '../wire/error.js';

/** Reads the JSON of a control call, name by name; a wrong kind or an unknown name is a 400. */
export class Reader {
  private readonly seen = new Set<string>();
  private readonly body: Record<string, unknown>;

  constructor(body: unknown) {
    if (body !== undefined && (typeof body !== 'object' || body === null || Array.isArray(body))) {
      throw invalid('A JSON object is expected.');
    }
    this.body = { ...body };
  }

  text(name: string): string | undefined {
    const value = this.take(name);
    if (value === undefined || typeof value === 'string') return value;
    throw invalid(`Invalid ${name}: text is expected.`, name);
  }

  integer(name: string): number | undefined {
    const value = this.take(name);
    if (value === undefined) return undefined;
    if (typeof value === 'number' && Number.isSafeInteger(value)) return value;
    throw invalid(`Invalid ${name}: an integer is expected.`, name);
  }

  flag(name: string): boolean | undefined {
    const value = this.take(name);
    if (value === undefined || typeof value === 'boolean') return value;
    throw invalid(`Invalid ${name}: true or false is expected.`, name);
  }

  oneOf<const T extends string>(name: string, choices: readonly T[]): T | undefined {
    const value = this.take(name);
    if (value === undefined) return undefined;
    const found = choices.find((choice) => choice === value);
    if (found === undefined) throw invalid(`Invalid ${name}: must be one of ${choices.join(', ')}`, name);
    return found;
  }

  list(name: string): unknown[] | undefined {
    const value = this.take(name);
    if (value === undefined || Array.isArray(value)) return value;
    throw invalid(`Invalid ${name}: a list is expected.`, name);
  }

  /** To be called last: refuses what nobody asked for. */
  end(): void {
    const strangers = Object.keys(this.body).filter((name) => !this.seen.has(name));
    if (strangers.length > 0) throw invalid(`Unknown: ${strangers.join(', ')}`, strangers[0]);
  }

  private take(name: string): unknown {
    this.seen.add(name);
    return Object.hasOwn(this.body, name) ? this.body[name] : undefined;
  }
}

/** For what must be given. */
export function needed<T>(value: T | undefined, name: string): T {
  if (value === undefined) throw invalid(`Missing: ${name}`, name);
  return value;
}
