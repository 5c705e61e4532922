import type Stripe from 'stripe';

/** A checkout session with what its object does not show: the lines and what to do once it is paid. */
export interface SessionRecord {
  session: Stripe.Checkout.Session;
  lines: Stripe.LineItem[];
  intentDescription: string | null;
  intentMetadata: Stripe.Metadata;
  subscriptionMetadata: Stripe.Metadata;
  trialEnd: number | null;
}

/** What one account, the platform or a connected one, owns. Each shelf is keyed by id. */
export interface Book {
  customers: Record<string, Stripe.Customer>;
  products: Record<string, Stripe.Product>;
  prices: Record<string, Stripe.Price>;
  sessions: Record<string, SessionRecord>;
  portalSessions: Record<string, Stripe.BillingPortal.Session>;
  paymentIntents: Record<string, Stripe.PaymentIntent>;
  paymentMethods: Record<string, Stripe.PaymentMethod>;
  charges: Record<string, Stripe.Charge>;
  refunds: Record<string, Stripe.Refund>;
  balanceTransactions: Record<string, Stripe.BalanceTransaction>;
  subscriptions: Record<string, Stripe.Subscription>;
  invoices: Record<string, Stripe.Invoice>;
  /** Proration lines that wait for a subscription's next invoice. */
  waitingLines: Record<string, Stripe.InvoiceLineItem[]>;
  /** Subscriptions whose next charge fails whatever the card. */
  failNext: Record<string, true>;
  /** Subscriptions that were told their trial ends soon. */
  trialWarned: Record<string, true>;
}

export function emptyBook(): Book {
  return {
    customers: {},
    products: {},
    prices: {},
    sessions: {},
    portalSessions: {},
    paymentIntents: {},
    paymentMethods: {},
    charges: {},
    refunds: {},
    balanceTransactions: {},
    subscriptions: {},
    invoices: {},
    waitingLines: {},
    failNext: {},
    trialWarned: {},
  };
}

/** Own keys only, so that an id such as `__proto__` finds nothing. */
export function onShelf<T>(shelf: Record<string, T>, id: string): T | undefined {
  return Object.hasOwn(shelf, id) ? shelf[id] : undefined;
}
