import { daysBetween, type DateText } from '../calendar/shop-dates.js';
import type { Cents } from '../money/cents.js';
import type { InvoiceStanding, InvoiceStatus } from './invoice-standings.js';

export type InvoiceAmounts = { totalCents: Cents; paidCents: Cents; creditedCents: Cents };

/** What is still owed. Never below zero: payments and credits above the balance are refused. */
export function balanceOf({ totalCents, paidCents, creditedCents }: InvoiceAmounts): Cents {
  return totalCents - paidCents - creditedCents;
}

/** The status of an issued invoice after a payment or a credit. Settled in part by money, it was paid. */
export function statusAfter(amounts: InvoiceAmounts): InvoiceStatus {
  if (balanceOf(amounts) > 0) return 'issued';
  return amounts.paidCents > 0 ? 'paid' : 'credited';
}

/** Whole days past the due date, the due date itself not counted; 0 when not past it or nothing is owed. */
export function daysOverdue(status: InvoiceStatus, dueOn: DateText | null, today: DateText): number {
  if (status !== 'issued' || dueOn === null) return 0;
  return Math.max(0, daysBetween(dueOn, today));
}

/** @param today the date in the shop's zone */
export function invoiceStanding(
  status: InvoiceStatus,
  paidCents: Cents,
  dueOn: DateText | null,
  today: DateText,
): { standing: InvoiceStanding; daysOverdue: number } {
  const late = daysOverdue(status, dueOn, today);
  if (status !== 'issued') return { standing: status, daysOverdue: 0 };
  if (late > 0) return { standing: 'overdue', daysOverdue: late };
  return { standing: paidCents > 0 ? 'part-paid' : 'due', daysOverdue: 0 };
}
