import type { UnitOfWork } from '../../platform/database/unit-of-work.js';
import type { Payments } from '../../platform/payments/payments-client.js';
import type { PaymentEventHandler } from '../../platform/payments/webhook.js';
import { CardPayments } from './card-payments.js';
import { CardSettlement } from './card-settlement.js';
import { CLOSE_CHECKOUT, type ClosingCheckout } from './checkout-withdrawal.js';
import { CreditsService } from './credits-service.js';
import { InvoiceDrafts } from './invoice-drafts.js';
import { InvoiceIssuing } from './invoice-issuing.js';
import { InvoiceLetters, type LinkToInvoice } from './invoice-letters.js';
import { PaymentsService } from './payments-service.js';

export type InvoiceServices = {
  drafts: InvoiceDrafts;
  issuing: InvoiceIssuing;
  payments: PaymentsService;
  credits: CreditsService;
  letters: InvoiceLetters;
  cards: CardPayments;
};
type Ground = { payments: Payments; work: UnitOfWork; clock: () => Date };

export function createInvoiceServices(ground: Ground, linkTo: LinkToInvoice): InvoiceServices {
  const drafts = new InvoiceDrafts();
  const records = new PaymentsService();
  const letters = new InvoiceLetters(linkTo);
  const settlement = new CardSettlement({ ...ground, records, letters });
  return {
    drafts,
    issuing: new InvoiceIssuing(drafts),
    payments: records,
    credits: new CreditsService(),
    letters,
    cards: new CardPayments({ ...ground, settlement }),
  };
}

/** What invoices carry out from the outbox. */
export function invoicesOutbox({ cards }: InvoiceServices) {
  return {
    [CLOSE_CHECKOUT]: (closing: ClosingCheckout, message: { id: string }) => cards.close(closing, message.id),
  };
}

/** The provider's events about shops' connected accounts that invoices act on. */
export function invoicesPaymentEvents({ cards }: InvoiceServices): Record<string, PaymentEventHandler> {
  const onSession: PaymentEventHandler = (event) => cards.onSession(event);
  return {
    'checkout.session.completed': onSession,
    'checkout.session.async_payment_succeeded': onSession,
    'checkout.session.expired': onSession,
  };
}
