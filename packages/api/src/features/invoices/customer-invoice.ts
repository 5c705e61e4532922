import type { CustomerInvoice } from '@bookmatch/common/customer-page/customer-page-contract';
import { invoiceStanding } from '@bookmatch/common/invoices/invoice-standing';
import { cardTakes } from '@bookmatch/common/invoices/overpayment-rules';
import type { ShopScope } from '../../platform/database/scope.js';
import { notFound } from '../../platform/http/problem-error.js';
import { shopOf, todayAt } from '../shops/shops-public.js';
import { InvoiceLine } from './invoice-line.entity.js';
import { Invoice } from './invoice.entity.js';
import { Payment } from './payment.entity.js';

/** The invoice as its customer reads it: nothing of the shop's own. @throws not-found while it is a draft */
export async function customerInvoice(scope: ShopScope, id: string): Promise<CustomerInvoice> {
  const invoice = await scope.rows(Invoice).get(id);
  const { number, issuedOn, dueOn, frame, status, paidCents, balanceCents } = invoice;
  if (number === null || issuedOn === null || dueOn === null || frame === null)
    throw notFound('This invoice');
  const shop = await shopOf(scope);
  const lines = await scope.rows(InvoiceLine).findBy({ invoiceId: id }, 'position');
  const payments = await scope.rows(Payment).findBy({ invoiceId: id }, 'id');
  return {
    ...invoice,
    number,
    issuedOn,
    dueOn,
    customerName: frame.customer.name,
    jobTitle: frame.job?.title ?? null,
    stageName: frame.stageName,
    currency: frame.currency,
    ...invoiceStanding(status, paidCents, dueOn, todayAt(shop, scope.now)),
    lines,
    heldCents: invoice.overpaidCents,
    payments: shownPayments(payments),
    canPayByCard: status === 'issued' && shop.cardPayments === 'ready' && cardTakes(balanceCents),
  };
}

/**
 * What paid the invoice, so that it adds up to the balance. A payment that was recorded wrongly and taken back is the
 * shop's own matter, and what came beyond the debt is said apart.
 */
function shownPayments(payments: readonly Payment[]): CustomerInvoice['payments'] {
  const reversed = new Set(payments.map(({ reversesId }) => reversesId));
  return payments
    .filter(({ id, kind, appliedCents }) => kind === 'payment' && !reversed.has(id) && appliedCents > 0)
    .map(({ receivedOn, method, appliedCents }) => ({ receivedOn, method, amountCents: appliedCents }));
}
