import type { ShopScope } from '@bookmatch/api/platform/database/scope';
import type { ShopRow } from '@bookmatch/api/platform/database/rows';
import { Estimate } from '@bookmatch/api/features/estimates/estimates-public';
import { Invoice, readTotals } from '@bookmatch/api/features/invoices/invoices-public';
import { Job } from '@bookmatch/api/features/jobs/jobs-public';
import { Lead } from '@bookmatch/api/features/leads/leads-public';
import { Member, shopOf } from '@bookmatch/api/features/shops/shops-public';
import { TimeEntry } from '@bookmatch/api/features/time/time-public';
import { dateIn } from '@bookmatch/common/calendar/shop-dates';
import { formatMoney } from '@bookmatch/common/money/format';
import type { Person } from '../cast/people.js';
import type { Desk } from '../making/desk.js';
import { reading } from '../making/opening.js';

/** A sentence of what there is in a shop. */
export function summaryOf(desk: Desk, owner: Person, now: Date): Promise<string> {
  return reading(desk, owner, now, async (scope) => {
    const { name, currency } = await shopOf(scope);
    const { aging, overdueCents } = await readTotals(scope, {}, dateIn(desk.zone, now.toISOString()));
    const [members, leads, estimates] = [
      await count(scope, Member),
      await count(scope, Lead),
      await count(scope, Estimate),
    ];
    const [jobs, entries, invoices] = [
      await count(scope, Job),
      await count(scope, TimeEntry),
      await count(scope, Invoice),
    ];
    return (
      `${name} has ${members} members, ${leads} leads, ${estimates} estimates, ${jobs} jobs, ${entries} time entries ` +
      `and ${invoices} invoices, on which ${formatMoney(aging.totalCents, currency)} is owed and ` +
      `${formatMoney(overdueCents, currency)} of it overdue.`
    );
  });
}

const count = (scope: ShopScope, entity: new () => ShopRow): Promise<number> =>
  scope.query(entity, 'row').count();
