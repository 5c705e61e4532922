/** A clock that a test sets. It moves on by a millisecond at each reading, so that rows keep their order. */
export class TestClock {
  private time: number;

  constructor(start = '2026-06-01T15:00:00.000Z') {
    this.time = Date.parse(start);
  }

  readonly read = (): Date => new Date((this.time += 1));

  set(instant: string): void {
    this.time = Date.parse(instant);
  }

  forward(amount: { days?: number; hours?: number; minutes?: number }): void {
    const { days = 0, hours = 0, minutes = 0 } = amount;
    this.time += ((days * 24 + hours) * 60 + minutes) * 60_000;
  }
}
