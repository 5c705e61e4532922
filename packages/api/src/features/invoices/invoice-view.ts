import { dateIn } from '@bookmatch/common/calendar/shop-dates';
import { issueRefusals } from '@bookmatch/common/invoices/invoice-totals';
import { invoiceStanding } from '@bookmatch/common/invoices/invoice-standing';
import type {
  CreditNote as CreditNoteView,
  Invoice as InvoiceView,
  Payment as PaymentView,
} from '@bookmatch/common/invoices/invoices-contract';
import type { ShopScope } from '../../platform/database/scope.js';
import { Customer } from '../customers/customers-public.js';
import { Job, JobBillingStage } from '../jobs/jobs-public.js';
import { memberNames, shopOf } from '../shops/shops-public.js';
import { CreditNote } from './credit-note.entity.js';
import { InvoiceLetter } from './invoice-letter.entity.js';
import { InvoiceLine } from './invoice-line.entity.js';
import { Invoice } from './invoice.entity.js';
import { Payment } from './payment.entity.js';

/** An invoice with all that belongs to it. */
export async function readInvoice(scope: ShopScope, id: string): Promise<InvoiceView> {
  const invoice = await scope.rows(Invoice).get(id);
  const of = { invoiceId: id };
  const [shop, around, lines, payments, notes, letters, names] = await Promise.all([
    shopOf(scope),
    readAround(scope, invoice),
    scope.rows(InvoiceLine).findBy(of, 'position'),
    scope.rows(Payment).findBy(of, 'id'),
    scope.rows(CreditNote).findBy(of, 'id'),
    scope.rows(InvoiceLetter).findBy(of, 'id'),
    memberNames(scope),
  ]);
  const { status, paidCents, dueOn } = invoice;
  const today = dateIn(shop.timeZone, scope.now.toISOString());
  return {
    ...invoice,
    ...around,
    ...invoiceStanding(status, paidCents, dueOn, today),
    taxRate: invoice.billingStageId ? null : invoice.taxRate,
    lines,
    payments: payments.map((payment) => viewPayment(payment, payments, names)),
    creditNotes: notes.map(viewCreditNote),
    sends: letters.map(({ id: letterId, document, recipient, createdAt }) => ({
      id: letterId,
      document,
      to: recipient,
      sentAt: createdAt.toISOString(),
    })),
    issueRefusals: status === 'draft' ? issueRefusals(lines, invoice) : [],
    createdAt: invoice.createdAt.toISOString(),
  };
}

async function readAround(
  scope: ShopScope,
  { customerId, jobId, billingStageId }: Invoice,
): Promise<Pick<InvoiceView, 'customer' | 'job' | 'billingStage'>> {
  const [customer, job, billingStage] = await Promise.all([
    scope.rows(Customer).get(customerId),
    jobId ? scope.rows(Job).get(jobId) : null,
    billingStageId ? scope.rows(JobBillingStage).get(billingStageId) : null,
  ]);
  return { customer, job, billingStage };
}

/** @param all every payment of the same invoice, to find what took this one back */
export function viewPayment(
  payment: Payment,
  all: readonly Payment[],
  names: ReadonlyMap<string, string>,
): PaymentView {
  const { memberId, createdAt } = payment;
  return {
    ...payment,
    reversedById: all.find(({ reversesId }) => reversesId === payment.id)?.id ?? null,
    recordedBy: memberId ? (names.get(memberId) ?? null) : null,
    createdAt: createdAt.toISOString(),
  };
}

export function viewCreditNote(note: CreditNote): CreditNoteView {
  return { ...note };
}
