import type { ShopScope } from '../../platform/database/scope.js';

/** Time clocked to one operation of a job, in closed entries that were not voided. */
export type ClockedOperation = {
  operationId: string;
  minutes: number;
  /** The part of `minutes` that falls in the current workweek of the shop. */
  thisWeekMinutes: number;
  // money
  costCents: number;
};

/**
 * What jobs need to know of the clock. Time entries point at jobs, so that slice stands above this one: it says these
 * reads in its own tables, and compose.ts hands them down.
 */
export interface ClockedTime {
  byOperation(scope: ShopScope, jobId: string): Promise<ClockedOperation[]>;
  /** The names of the members who are clocked in to the job right now. */
  clockedIn(scope: ShopScope, jobId: string): Promise<string[]>;
  /**
   * For lists: SQL sums over a job's time, as expressions beside the alias `job` of the table `job`. They must join on
   * `job.shop_id` and `job.id` and answer 0 where nothing was clocked.
   */
  readonly sums: { minutes: string; costCents: string };
}
