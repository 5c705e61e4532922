import { addDays } from '@bookmatch/common/calendar/shop-dates';
import { ageBalances, type OpenBalance } from '@bookmatch/common/invoices/aging';
import type { Aging, AgingBuckets } from '@bookmatch/common/invoices/aging-contract';
import type { InvoiceListTotals, InvoiceTotalsQuery } from '@bookmatch/common/invoices/invoices-contract';
import type { ShopQuery } from '../../platform/database/shop-query.js';
import type { ShopScope } from '../../platform/database/scope.js';
import { Customer } from '../customers/customers-public.js';
import { Invoice } from './invoice.entity.js';

/**
 * What is owed, by customer and by age. Balances are those of now; `on` says from which day their age is counted.
 *
 * @param on `YYYY-MM-DD` in the shop's zone
 */
export async function readAging(scope: ShopScope, on: string): Promise<Aging> {
  const balances = await scope
    .query(Invoice, 'invoice')
    .join(Customer, 'customer', 'customer.id = invoice.customerId')
    .pick({
      customerId: 'invoice.customerId',
      customerName: 'customer.name',
      dueOn: 'invoice.dueOrder',
      balanceCents: 'sum(invoice.balanceCents)',
    })
    .where("invoice.status = 'issued'")
    .groupBy('invoice.customerId')
    .groupBy('customer.name')
    .groupBy('invoice.dueOrder')
    .all<OpenBalance>();
  return ageBalances(
    balances.map((balance) => ({ ...balance, balanceCents: Number(balance.balanceCents) })),
    on,
  );
}

/** The head of the list of invoices: all that is owed by age, and the drafts. One statement over one index. */
export async function readTotals(
  scope: ShopScope,
  { customerId, jobId }: InvoiceTotalsQuery,
  today: string,
): Promise<InvoiceListTotals> {
  const query = scope
    .query(Invoice, 'invoice')
    .pick(SUMS)
    .where("invoice.status in ('draft', 'issued')", daysBefore(today));
  narrow(query, customerId, jobId);
  const sums = await query.first<Record<keyof typeof SUMS, string | null>>();
  const read = (key: keyof typeof SUMS) => Number(sums?.[key] ?? 0);
  const aging = Object.fromEntries(AGES.map((age) => [age, read(age)])) as AgingBuckets;
  return {
    on: today,
    aging,
    overdueCents: aging.totalCents - aging.currentCents,
    openCount: read('openCount'),
    overdueCount: read('overdueCount'),
    draftCents: read('draftCents'),
    draftCount: read('draftCount'),
  };
}

/** What is owed on invoices due until a day, that day included: what should come in by then, what is late with it. */
export async function owedUntil(scope: ShopScope, day: string): Promise<number> {
  const sum = await scope
    .query(Invoice, 'invoice')
    .pick({ cents: 'coalesce(sum(invoice.balanceCents), 0)' })
    .where("invoice.status = 'issued' and invoice.dueOrder <= :day", { day })
    .first<{ cents: number | string }>();
  return Number(sum?.cents ?? 0);
}

export function countOverdue(scope: ShopScope, today: string): Promise<number> {
  return scope
    .query(Invoice, 'invoice')
    .where("invoice.status = 'issued' and invoice.dueOrder < :today", { today })
    .count();
}

function narrow(query: ShopQuery, customerId: string | undefined, jobId: string | undefined): void {
  if (customerId) query.where('invoice.customerId = :customerId', { customerId });
  if (jobId) query.where('invoice.jobId = :jobId', { jobId });
}

const ISSUED = "invoice.status = 'issued'";
const sumWhere = (condition: string, amount: string) =>
  `sum(case when ${condition} then ${amount} else 0 end)`;
const owed = (condition: string) => sumWhere(`${ISSUED} and ${condition}`, 'invoice.balanceCents');

/** The buckets of `AGING_BUCKETS`, said in SQL by due dates. */
const SUMS = {
  currentCents: owed('invoice.dueOrder >= :today'),
  days1To30Cents: owed('invoice.dueOrder < :today and invoice.dueOrder >= :before30'),
  days31To60Cents: owed('invoice.dueOrder < :before30 and invoice.dueOrder >= :before60'),
  days61To90Cents: owed('invoice.dueOrder < :before60 and invoice.dueOrder >= :before90'),
  over90Cents: owed('invoice.dueOrder < :before90'),
  totalCents: owed('1 = 1'),
  openCount: sumWhere(ISSUED, '1'),
  overdueCount: sumWhere(`${ISSUED} and invoice.dueOrder < :today`, '1'),
  draftCents: sumWhere("invoice.status = 'draft'", 'invoice.totalCents'),
  draftCount: sumWhere("invoice.status = 'draft'", '1'),
};
const AGES = [
  'currentCents',
  'days1To30Cents',
  'days31To60Cents',
  'days61To90Cents',
  'over90Cents',
  'totalCents',
] as const satisfies (keyof AgingBuckets)[];

const daysBefore = (today: string) => ({
  today,
  before30: addDays(today, -30),
  before60: addDays(today, -60),
  before90: addDays(today, -90),
});
