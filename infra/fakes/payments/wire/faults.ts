export const FAULT_KINDS = [
  'error-before',
  'error-after',
  'reset-before',
  'reset-after',
  'hang-before',
  'hang-after',
  'slow',
] as const;

/**
 * What goes wrong with a call: an answer of 500, a cut connection or no answer at all, each before or after the
 * work is done; `slow` works and answers, but holds its idempotency key for `delayMs` first.
 */
export type FaultKind = (typeof FAULT_KINDS)[number];

export interface Fault {
  kind: FaultKind;
  /** How many matching calls it strikes. */
  calls: number;
  delayMs: number;
  /** Only this method and only addresses that begin so, when given. */
  method?: string;
  path?: string;
}

/** The faults that wait for their call, in the order they were set. */
export class Faults {
  private waiting: Fault[] = [];

  set(fault: Fault): void {
    this.waiting.push({ ...fault });
  }

  clear(): void {
    this.waiting = [];
  }

  /** The fault that strikes this call, counted down. */
  take(method: string, path: string): Fault | null {
    const fault = this.waiting.find((one) => strikes(one, method, path));
    if (fault === undefined) return null;
    fault.calls -= 1;
    if (fault.calls <= 0) this.waiting = this.waiting.filter((one) => one !== fault);
    return fault;
  }
}

function strikes(fault: Fault, method: string, path: string): boolean {
  if (fault.method !== undefined && fault.method.toUpperCase() !== method.toUpperCase()) return false;
  return fault.path === undefined || path.startsWith(fault.path);
}
