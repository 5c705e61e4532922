import { PAYMENT_METHOD_NAMES } from '@bookmatch/common/invoices/invoice-words';
import type { Content } from 'pdfmake/interfaces.js';
import type { ShopScope } from '../../platform/database/scope.js';
import { letterhead } from '../../platform/documents/letterhead.js';
import { renderPdf } from '../../platform/documents/render-pdf.js';
import { conflict } from '../../platform/http/problem-error.js';
import type { RenderedDocument } from '../../platform/mail/mail.js';
import { CreditNote } from './credit-note.entity.js';
import {
  dayOf,
  factsOf,
  jobFact,
  linesTable,
  paragraph,
  recipientOf,
  totalsTable,
  type Total,
} from './document-parts.js';
import { InvoiceLine } from './invoice-line.entity.js';
import { Invoice } from './invoice.entity.js';
import { currentFrame, type IssuedFrame } from './issued-frame.js';
import { Payment } from './payment.entity.js';

/** The invoice in the shop's name. A draft says that it is one. */
export async function invoiceDocument(scope: ShopScope, id: string): Promise<RenderedDocument> {
  const invoice = await scope.rows(Invoice).get(id);
  const frame = await frameOf(scope, invoice);
  const lines = await scope.rows(InvoiceLine).findBy({ invoiceId: id }, 'position');
  const title = invoice.number === null ? 'Draft invoice' : `Invoice ${invoice.number}`;
  const facts = factsOf({
    Issued: dayOf(invoice.issuedOn) ?? 'Not yet',
    Due: dayOf(invoice.dueOn),
    Job: jobFact(frame),
  });
  return render(scope, frame, title, [
    ...letterhead(frame.shop, title, recipientOf(frame), facts),
    linesTable(lines, frame.currency),
    totalsTable(invoiceTotals(invoice), frame.currency),
    ...paragraph(invoice.memo),
  ]);
}

export async function creditNoteDocument(scope: ShopScope, id: string): Promise<RenderedDocument> {
  const note = await scope.rows(CreditNote).get(id);
  const invoice = await scope.rows(Invoice).get(note.invoiceId);
  const frame = await frameOf(scope, invoice);
  const title = `Credit note ${note.number}`;
  const facts = factsOf({
    Issued: dayOf(note.issuedOn),
    Invoice: `${invoice.number}, ${dayOf(invoice.issuedOn)}`,
    Job: jobFact(frame),
  });
  const totals = [
    { label: 'Net', cents: note.netCents },
    { label: 'Sales tax', cents: note.taxCents },
    { label: 'Credited', cents: note.amountCents },
  ];
  return render(scope, frame, title, [
    ...letterhead(frame.shop, title, recipientOf(frame), facts),
    { text: note.reason },
    totalsTable(totals, frame.currency),
  ]);
}

/** @throws conflict for what is no payment that came in */
export async function receiptDocument(scope: ShopScope, id: string): Promise<RenderedDocument> {
  const payment = await scope.rows(Payment).get(id);
  if (payment.kind !== 'payment') throw conflict('There is a receipt only for a payment that came in.');
  const invoice = await scope.rows(Invoice).get(payment.invoiceId);
  const frame = await frameOf(scope, invoice);
  const title = `Receipt for invoice ${invoice.number}`;
  const facts = factsOf({
    Received: dayOf(payment.receivedOn),
    'Paid by': PAYMENT_METHOD_NAMES[payment.method],
    Reference: payment.reference,
    Job: jobFact(frame),
  });
  return render(scope, frame, title, [
    ...letterhead(frame.shop, title, recipientOf(frame), facts),
    { text: `Received with thanks for invoice ${invoice.number} of ${dayOf(invoice.issuedOn)}.` },
    totalsTable(receiptTotals(payment), frame.currency),
  ]);
}

const frameOf = async (scope: ShopScope, invoice: Invoice): Promise<IssuedFrame> =>
  invoice.frame ?? (await currentFrame(scope, invoice));

function invoiceTotals(invoice: Invoice): Total[] {
  const { netCents, taxCents, totalCents, paidCents, creditedCents, balanceCents } = invoice;
  const moved: Total[] = [
    { label: 'Credited', cents: -creditedCents },
    { label: 'Paid', cents: -paidCents },
    { label: 'Balance due', cents: balanceCents },
  ];
  return [
    { label: 'Net', cents: netCents },
    { label: 'Sales tax', cents: taxCents },
    { label: 'Total', cents: totalCents },
    ...(paidCents + creditedCents > 0
      ? moved.filter(({ cents, label }) => cents !== 0 || label === 'Balance due')
      : []),
  ];
}

function receiptTotals({ amountCents, appliedCents }: Payment): Total[] {
  const excess = amountCents - appliedCents;
  const received = { label: 'Received', cents: amountCents };
  if (excess === 0) return [received];
  return [
    { label: 'Paid on the invoice', cents: appliedCents },
    { label: 'Held for you', cents: excess },
    received,
  ];
}

async function render(
  scope: ShopScope,
  frame: IssuedFrame,
  title: string,
  content: Content[],
): Promise<RenderedDocument> {
  const body = await renderPdf(title, frame.shop.name, content, scope.now);
  return { name: `${title}.pdf`, type: 'application/pdf', body };
}
