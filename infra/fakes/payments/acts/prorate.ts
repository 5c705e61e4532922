import type Stripe from 'stripe';
import type { Desk } from '../desk.js';
import { buildInvoiceLine } from '../objects/invoice-line.js';

/** Integer cents of `quantity` units for the part of the period that is left, rounded half up. */
export function remainingCents(item: Stripe.SubscriptionItem, quantity: number, now: number): number {
  const whole = item.current_period_end - item.current_period_start;
  const left = Math.max(0, item.current_period_end - Math.max(now, item.current_period_start));
  return Math.floor((quantity * (item.price.unit_amount ?? 0) * left * 2 + whole) / (whole * 2));
}

/** Lays aside, for the next invoice, a credit for what was paid ahead and a charge for the new quantity. */
export function prorate(desk: Desk, item: Stripe.SubscriptionItem, before: number, after: number): void {
  const now = desk.now();
  const credit = -remainingCents(item, before, now);
  const charge = remainingCents(item, after, now);
  const lines = [
    line(item, credit, `Unused time on ${before}`, before, now),
    line(item, charge, `Remaining time on ${after}`, after, now),
  ];
  desk.book.waitingLines[item.subscription] = [
    ...(desk.book.waitingLines[item.subscription] ?? []),
    ...lines,
  ];
}

function line(
  item: Stripe.SubscriptionItem,
  amountCents: number,
  description: string,
  quantity: number,
  now: number,
): Stripe.InvoiceLineItem {
  const period = { periodStart: now, periodEnd: item.current_period_end };
  return buildInvoiceLine({ amountCents, description, item, quantity, ...period, proration: true });
}
