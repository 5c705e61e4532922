import { inOrder, carryOut, type Act } from './acts.js';
import type { Desk } from './desk.js';
import type { Trail } from './trail.js';

const DAY_MS = 86_400_000;
export type Story = { acts: readonly Act[]; trail: Trail };

/**
 * Carries a shop's history out, day by day. The office is one day ahead of the floor, and both work side by side: what
 * the clock needs of a day is made on the day before, and a job is closed only days after its last punch.
 */
export async function liveThrough(desk: Desk, office: Story, floor: Story): Promise<void> {
  const [ahead, behind] = [new Lane(office.acts), new Lane(floor.acts)];
  const begin = Math.min(ahead.firstMs, behind.firstMs);
  for (let until = begin + DAY_MS; !ahead.isEmpty || !behind.isEmpty; until += DAY_MS)
    await Promise.all([
      carryOut(desk, office.trail, ahead.takeUntil(until + DAY_MS)),
      carryOut(desk, floor.trail, behind.takeUntil(until)),
    ]);
}

/** Acts that follow each other, taken out a day at a time. */
class Lane {
  private readonly waiting: Act[];

  constructor(acts: readonly Act[]) {
    this.waiting = inOrder(acts);
  }

  get isEmpty(): boolean {
    return this.waiting.length === 0;
  }

  get firstMs(): number {
    return this.waiting[0]?.at.getTime() ?? Number.POSITIVE_INFINITY;
  }

  takeUntil(untilMs: number): Act[] {
    const later = this.waiting.findIndex(({ at }) => at.getTime() >= untilMs);
    return this.waiting.splice(0, later < 0 ? this.waiting.length : later);
  }
}
