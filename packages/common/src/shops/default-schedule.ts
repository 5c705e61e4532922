import type { BillingStagePlan } from '../estimates/billing-schedule-contract.js';
import { refuseSchedule } from '../estimates/billing-schedule.js';
import type { Refusal } from '../problems/problem.js';

/** A price no job reaches: a schedule that bills it whole bills every price that its fixed amounts fit in. */
const ANY_PRICE_CENTS = 1_000_000_000;

/** Why a shop cannot bill every new job by this schedule, or null. The price is not known yet. */
export function refuseDefaultSchedule(schedule: readonly BillingStagePlan[]): Refusal | null {
  const refusal = refuseSchedule(schedule, ANY_PRICE_CENTS);
  if (!refusal) return null;
  const { detail } = refusal;
  return { code: 'invalid-input', detail, fields: [{ path: 'defaultBillingSchedule', message: detail }] };
}
