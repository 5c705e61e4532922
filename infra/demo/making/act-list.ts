import type { ShopScope } from '@bookmatch/api/platform/database/scope';
import type { Person } from '../cast/people.js';
import type { WorkdayIndex } from '../plan/project.js';
import type { Act } from './acts.js';
import type { When } from './when.js';

/** Gathers acts by the plan's days; those of days to come are left out. */
export class ActList {
  readonly acts: Act[] = [];

  constructor(private readonly when: When) {}

  /** @param hour on the wall of the shop, in 24 hours */
  add(on: WorkdayIndex | null, hour: number, by: Person, run: (scope: ShopScope) => Promise<unknown>): void {
    const at = on === null ? null : this.when.near(on, hour);
    if (at) this.acts.push({ at, by, run: async (scope) => void (await run(scope)) });
  }

  /** For what calls the payment provider, or keeps files. */
  addAlone(on: WorkdayIndex | null, hour: number, run: (at: Date) => Promise<unknown>): void {
    const at = on === null ? null : this.when.near(on, hour);
    if (at) this.acts.push({ at, alone: async () => void (await run(at)) });
  }
}
