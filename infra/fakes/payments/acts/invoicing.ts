import type Stripe from 'stripe';
import { cardByLast4, type TestCard } from '../cards.js';
import type { Desk } from '../desk.js';
import { buildInvoice } from '../objects/invoice.js';
import { buildInvoiceLine } from '../objects/invoice-line.js';
import { buildPaymentIntent } from '../objects/payment-intent.js';
import { chargeCard } from './charge-card.js';

const DAYS_TO_RETRY = 3;
const DAY_SECONDS = 24 * 60 * 60;

export function stepMonths(price: Stripe.Price): number {
  const count = price.recurring?.interval_count ?? 1;
  return price.recurring?.interval === 'year' ? 12 * count : count;
}

/** The customer a subscription bills. */
export function customerOf(desk: Desk, subscription: Stripe.Subscription): Stripe.Customer {
  const { customer } = subscription;
  const found = desk.book.customers[typeof customer === 'string' ? customer : customer.id];
  if (found === undefined) throw new Error(`Subscription ${subscription.id} has no customer`);
  return found;
}

/** Writes the invoice of the current period, with the prorations that waited for it. It is not yet paid. */
export function billSubscription(
  desk: Desk,
  subscription: Stripe.Subscription,
  reason: 'subscription_create' | 'subscription_cycle' | 'subscription_update',
): Stripe.Invoice {
  const customer = customerOf(desk, subscription);
  const waiting = desk.book.waitingLines[subscription.id] ?? [];
  delete desk.book.waitingLines[subscription.id];
  const fresh =
    reason === 'subscription_update'
      ? []
      : subscription.items.data.map((item) => periodLine(item, subscription));
  const invoice = buildInvoice({
    customer,
    subscription,
    lines: [...waiting, ...fresh],
    reason,
    number: nextNumber(customer),
    periodStart: subscription.items.data[0]?.current_period_start ?? desk.now(),
    periodEnd: subscription.items.data[0]?.current_period_end ?? desk.now(),
    now: desk.now(),
  });
  customer.balance = invoice.ending_balance ?? 0;
  desk.book.invoices[invoice.id] = invoice;
  subscription.latest_invoice = invoice.id;
  return invoice;
}

function nextNumber(customer: Stripe.Customer): string {
  const sequence = customer.next_invoice_sequence ?? 1;
  customer.next_invoice_sequence = sequence + 1;
  return `${customer.invoice_prefix ?? ''}-${String(sequence).padStart(4, '0')}`;
}

/** A trial period is on the invoice at no charge. */
function periodLine(
  item: Stripe.SubscriptionItem,
  subscription: Stripe.Subscription,
): Stripe.InvoiceLineItem {
  const quantity = item.quantity ?? 1;
  const trial = subscription.status === 'trialing';
  return buildInvoiceLine({
    amountCents: trial ? 0 : quantity * (item.price.unit_amount ?? 0),
    description: trial ? 'Trial period' : `${quantity} for the period`,
    item,
    quantity,
    periodStart: item.current_period_start,
    periodEnd: item.current_period_end,
    proration: false,
  });
}

export interface CollectOptions {
  /** The card holder is at the page, so a card that only fails later goes through. */
  cardPresent: boolean;
  /** Declined whatever the card. */
  forceDecline?: boolean;
  /** Unix seconds of the next try after a decline; null for none, three days on unless given. */
  nextAttempt?: number | null;
}

/** Tries to collect an open invoice and says in events what came of it. Gives whether it is paid. */
export function collect(
  desk: Desk,
  subscription: Stripe.Subscription,
  invoice: Stripe.Invoice,
  options: CollectOptions,
): boolean {
  const paid = invoice.amount_remaining === 0 || chargeInvoice(desk, subscription, invoice, options);
  if (paid) markPaid(desk, subscription, invoice);
  else markFailed(desk, subscription, invoice, options);
  return paid;
}

function markPaid(desk: Desk, subscription: Stripe.Subscription, invoice: Stripe.Invoice): void {
  invoice.status = 'paid';
  invoice.attempted = true;
  invoice.amount_paid = invoice.amount_due;
  invoice.amount_remaining = 0;
  invoice.auto_advance = false;
  invoice.next_payment_attempt = null;
  invoice.status_transitions.paid_at = desk.now();
  customerOf(desk, subscription).delinquent = false;
  desk.publish('invoice.paid', invoice);
}

function markFailed(
  desk: Desk,
  subscription: Stripe.Subscription,
  invoice: Stripe.Invoice,
  options: CollectOptions,
): void {
  const later = desk.now() + DAYS_TO_RETRY * DAY_SECONDS;
  invoice.next_payment_attempt = options.nextAttempt === undefined ? later : options.nextAttempt;
  invoice.attempted = true;
  customerOf(desk, subscription).delinquent = true;
  desk.publish('invoice.payment_failed', invoice);
}

function chargeInvoice(
  desk: Desk,
  subscription: Stripe.Subscription,
  invoice: Stripe.Invoice,
  options: CollectOptions,
): boolean {
  invoice.attempt_count += 1;
  const paymentMethod = paymentMethodOf(desk, subscription);
  const card = cardByLast4(paymentMethod?.card?.last4);
  if (paymentMethod === undefined || card === undefined) return false;
  const intent = buildPaymentIntent({
    amountCents: invoice.amount_remaining,
    currency: invoice.currency,
    customer: customerOf(desk, subscription).id,
    description:
      invoice.billing_reason === 'subscription_create' ? 'Subscription creation' : 'Subscription update',
    metadata: {},
    now: desk.now(),
  });
  const declineCode = declineCodeOf(card, options);
  return chargeCard(desk, { intent, card, paymentMethod, email: invoice.customer_email, declineCode });
}

function declineCodeOf(card: TestCard, options: CollectOptions): string | null {
  if (options.forceDecline === true) return 'generic_decline';
  return options.cardPresent ? card.declinesNow : card.declinesLater;
}

export function paymentMethodOf(
  desk: Desk,
  subscription: Stripe.Subscription,
): Stripe.PaymentMethod | undefined {
  const held = subscription.default_payment_method;
  return typeof held === 'string' ? desk.book.paymentMethods[held] : undefined;
}
