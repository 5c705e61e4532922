import { addDays } from '@bookmatch/common/calendar/shop-dates';
import { TODAY_LIMIT, type OwnerToday } from '@bookmatch/common/today/today-contract';
import type { ShopScope } from '../../platform/database/scope.js';
import { estimatesWaiting } from '../estimates/estimates-public.js';
import { firstInvoices, owedUntil, readTotals } from '../invoices/invoices-public.js';
import { leadsDue, openLeadsByStage } from '../leads/leads-public.js';
import { onTheClock, workMinutesThisWeek } from '../time/time-public.js';
import { jobsByStage, jobsInHand } from './jobs-in-hand.js';

const EXPECTED_WITHIN_DAYS = 30;

/** The whole shop at a glance: what waits for the owner along the thread, and how the work stands. */
export async function ownerToday(scope: ShopScope, today: string): Promise<OwnerToday> {
  const totals = await readTotals(scope, {}, today);
  const overdue = await firstInvoices(scope, 'overdue', { today, limit: TODAY_LIMIT });
  return {
    role: 'owner',
    on: today,
    leadsToFollowUp: await leadsDue(scope, today, TODAY_LIMIT),
    leadsByStage: await openLeadsByStage(scope),
    estimatesWaiting: await estimatesWaiting(scope, TODAY_LIMIT),
    jobsByStage: await jobsByStage(scope),
    jobsInHand: await jobsInHand(scope, TODAY_LIMIT),
    overdueInvoices: { count: totals.overdueCount, rows: overdue },
    overdueCents: totals.overdueCents,
    aging: totals.aging,
    cashExpectedCents: await owedUntil(scope, addDays(today, EXPECTED_WITHIN_DAYS)),
    onTheClock: await onTheClock(scope),
    weekMinutes: await workMinutesThisWeek(scope),
  };
}
