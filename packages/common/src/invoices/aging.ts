import { daysBetween, type DateText } from '../calendar/shop-dates.js';
import { sumCents, type Cents } from '../money/cents.js';
import type { Aging, AgingBuckets, AgingRow } from './aging-contract.js';

export type OpenBalance = { customerId: string; customerName: string; dueOn: DateText; balanceCents: Cents };
type Bucket = Exclude<keyof AgingBuckets, 'totalCents'>;

/** Each bucket with the most days past due it takes. */
export const AGING_BUCKETS: readonly { bucket: Bucket; name: string; upToDays: number }[] = [
  { bucket: 'currentCents', name: 'Not yet due', upToDays: 0 },
  { bucket: 'days1To30Cents', name: '1 to 30 days', upToDays: 30 },
  { bucket: 'days31To60Cents', name: '31 to 60 days', upToDays: 60 },
  { bucket: 'days61To90Cents', name: '61 to 90 days', upToDays: 90 },
  { bucket: 'over90Cents', name: 'Over 90 days', upToDays: Number.POSITIVE_INFINITY },
];

/** @param daysPastDue below zero while it is not due */
export function bucketOf(daysPastDue: number): Bucket {
  return AGING_BUCKETS.find(({ upToDays }) => daysPastDue <= upToDays)!.bucket;
}

/** Open balances by customer and by how late they are, the largest debt first. */
export function ageBalances(balances: readonly OpenBalance[], on: DateText): Aging {
  const rows = new Map<string, AgingRow>();
  for (const { customerId, customerName, dueOn, balanceCents } of balances) {
    const row = rows.get(customerId) ?? { customerId, customerName, ...noBuckets() };
    row[bucketOf(daysBetween(dueOn, on))] += balanceCents;
    row.totalCents += balanceCents;
    rows.set(customerId, row);
  }
  const sorted = [...rows.values()]
    .filter((row) => row.totalCents !== 0)
    .sort((a, b) => b.totalCents - a.totalCents || (a.customerName < b.customerName ? -1 : 1));
  return { on, rows: sorted, totals: sumBuckets(sorted) };
}

function noBuckets(): AgingBuckets {
  return {
    currentCents: 0,
    days1To30Cents: 0,
    days31To60Cents: 0,
    days61To90Cents: 0,
    over90Cents: 0,
    totalCents: 0,
  };
}

function sumBuckets(rows: readonly AgingBuckets[]): AgingBuckets {
  const totals = noBuckets();
  for (const { bucket } of AGING_BUCKETS) totals[bucket] = sumCents(rows.map((row) => row[bucket]));
  totals.totalCents = sumCents(rows.map((row) => row.totalCents));
  return totals;
}
