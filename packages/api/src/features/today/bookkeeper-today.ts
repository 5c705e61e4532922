import { weekStart } from '@bookmatch/common/calendar/shop-dates';
import { TODAY_LIMIT, type BookkeeperToday } from '@bookmatch/common/today/today-contract';
import type { ShopScope } from '../../platform/database/scope.js';
import { firstInvoices, paymentsSince, readTotals } from '../invoices/invoices-public.js';

/** The money: what is to be issued, what is late, and what came in this workweek. */
export async function bookkeeperToday(scope: ShopScope, today: string): Promise<BookkeeperToday> {
  const totals = await readTotals(scope, {}, today);
  const first = { today, limit: TODAY_LIMIT };
  const { cents, ...payments } = await paymentsSince(scope, weekStart(today), TODAY_LIMIT);
  return {
    role: 'bookkeeper',
    on: today,
    draftsToIssue: { count: totals.draftCount, rows: await firstInvoices(scope, 'draft', first) },
    overdueInvoices: { count: totals.overdueCount, rows: await firstInvoices(scope, 'overdue', first) },
    overdueCents: totals.overdueCents,
    paymentsThisWeek: payments,
    paidThisWeekCents: cents,
    aging: totals.aging,
  };
}
