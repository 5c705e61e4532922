import { formatDate } from '@bookmatch/common/calendar/format';
import { daysOverdue } from '@bookmatch/common/invoices/invoice-standing';
import type { SendInvoice } from '@bookmatch/common/invoices/invoices-contract';
import { formatMoney } from '@bookmatch/common/money/format';
import type { ShopScope } from '../../platform/database/scope.js';
import { conflict } from '../../platform/http/problem-error.js';
import type { MailContent } from '../../platform/mail/mail-content.js';
import { sendMail } from '../../platform/mail/mail.js';
import { Customer } from '../customers/customers-public.js';
import { shopOf, todayAt, type Shop } from '../shops/shops-public.js';
import { CreditNote } from './credit-note.entity.js';
import { InvoiceLetter } from './invoice-letter.entity.js';
import { Invoice } from './invoice.entity.js';
import { Payment } from './payment.entity.js';

/** Makes a customer's link to the invoice and answers its address; given by `compose.ts` from the slice above. */
export type LinkToInvoice = (
  scope: ShopScope,
  invoice: { id: string; customerId: string },
) => Promise<string>;

type Sent = {
  invoice: Invoice;
  document: { kind: InvoiceLetter['document']; id: string };
  to: string;
  subject: string;
  content: Omit<MailContent, 'action' | 'footer'>;
};

/** Letters to the customer about an invoice, each with its PDF and the link to the customer's page. */
export class InvoiceLetters {
  constructor(private readonly linkTo: LinkToInvoice) {}

  /** Sends the invoice; again, when it is late, as a reminder. @throws stale-version, conflict while it is a draft */
  async sendInvoice(scope: ShopScope, id: string, input: SendInvoice, version: number): Promise<void> {
    const invoice = await scope.rows(Invoice).getForUpdate(id);
    await scope.rows(Invoice).update(invoice, {}, version);
    if (invoice.status === 'draft') throw conflict('Issue the invoice before you send it.');
    const shop = await shopOf(scope);
    const document = { kind: 'invoice', id } as const;
    await this.send(scope, shop, {
      invoice,
      document,
      to: input.to,
      ...invoiceWords(invoice, shop, input, scope),
    });
  }

  async sendCreditNote(scope: ShopScope, id: string, to: string): Promise<void> {
    const note = await scope.rows(CreditNote).get(id);
    const invoice = await scope.rows(Invoice).get(note.invoiceId);
    const shop = await shopOf(scope);
    const amount = formatMoney(note.amountCents, shop.currency);
    await this.send(scope, shop, {
      invoice,
      document: { kind: 'credit-note', id },
      to,
      subject: `Credit note ${note.number} from ${shop.name}`,
      content: {
        heading: `Credit note ${note.number}`,
        paragraphs: [
          `We have taken ${amount} off invoice ${invoice.number}: ${note.reason}`,
          stillOwed(invoice, shop),
        ],
      },
    });
  }

  /** @throws conflict for what is no payment that came in, and for one that was taken back */
  async sendReceipt(scope: ShopScope, id: string, to: string): Promise<void> {
    const payment = await scope.rows(Payment).get(id);
    if (payment.kind !== 'payment') throw conflict('There is a receipt only for a payment that came in.');
    // Taking it back locks the invoice first, too.
    await scope.rows(Invoice).getForUpdate(payment.invoiceId);
    if (await scope.rows(Payment).findOneBy({ reversesId: id }))
      throw conflict('This payment was taken back, so there is nothing to thank for.');
    await this.mailReceipt(scope, payment, to);
  }

  /** After a card payment nobody is there to press a button. A customer without an address gets none. */
  async sendReceiptByItself(scope: ShopScope, payment: Payment): Promise<void> {
    const { customerId } = await scope.rows(Invoice).get(payment.invoiceId);
    const { email } = await scope.rows(Customer).get(customerId);
    if (email) await this.mailReceipt(scope, payment, email);
  }

  private async mailReceipt(scope: ShopScope, payment: Payment, to: string): Promise<void> {
    const invoice = await scope.rows(Invoice).get(payment.invoiceId);
    const shop = await shopOf(scope);
    const amount = formatMoney(payment.amountCents, shop.currency);
    await this.send(scope, shop, {
      invoice,
      document: { kind: 'payment-receipt', id: payment.id },
      to,
      subject: `Receipt for invoice ${invoice.number} from ${shop.name}`,
      content: {
        heading: `We have received ${amount}`,
        paragraphs: [
          `Thank you. Your payment for invoice ${invoice.number} came on ${formatDate(payment.receivedOn)}.`,
          stillOwed(invoice, shop),
        ],
      },
    });
  }

  private async send(scope: ShopScope, shop: Shop, sent: Sent): Promise<void> {
    const { invoice, document, to, subject, content } = sent;
    await scope.rows(InvoiceLetter).insert({
      id: scope.newId(),
      invoiceId: invoice.id,
      document: document.kind,
      documentId: document.id,
      recipient: to,
      memberId: scope.stamp.author.kind === 'member' ? scope.stamp.author.memberId : null,
    });
    const url = await this.linkTo(scope, invoice);
    await sendMail(scope, {
      to,
      fromName: shop.name,
      ...(shop.email ? { replyTo: shop.email } : {}),
      subject,
      content: { ...content, action: actionOf(invoice, url), footer: footerOf(shop) },
      attachments: [{ ...document, shopId: scope.shopId }],
    });
  }
}

function invoiceWords(invoice: Invoice, shop: Shop, { message }: SendInvoice, scope: ShopScope) {
  const late = daysOverdue(invoice.status, invoice.dueOn, todayAt(shop, scope.now));
  const name = `Invoice ${invoice.number}`;
  const due = invoice.dueOn ? formatDate(invoice.dueOn) : '';
  const owed = `${formatMoney(invoice.balanceCents, shop.currency)} is due on ${due}.`;
  const overdue = `${formatMoney(invoice.balanceCents, shop.currency)} was due on ${due}, ${late} ${late === 1 ? 'day' : 'days'} ago.`;
  const standing = invoice.balanceCents === 0 ? 'Nothing is owed on it.' : late > 0 ? overdue : owed;
  return {
    subject: `${late > 0 ? 'Reminder: invoice' : 'Invoice'} ${invoice.number} from ${shop.name}`,
    content: {
      heading: invoice.frame?.job ? `${name}: ${invoice.frame.job.title}` : name,
      paragraphs: [...(message ? [message] : []), standing],
    },
  };
}

function stillOwed({ balanceCents, number }: Invoice, shop: Shop): string {
  return balanceCents === 0
    ? `Nothing is owed on invoice ${number} any more.`
    : `${formatMoney(balanceCents, shop.currency)} is still owed on invoice ${number}.`;
}

function actionOf({ balanceCents }: Invoice, url: string) {
  return { label: balanceCents > 0 ? 'Read and pay the invoice' : 'Read the invoice', url };
}

function footerOf(shop: Shop): string {
  const ways = [shop.phone, shop.email].filter(Boolean).join(' or ');
  return ways ? `Questions? ${shop.name} answers at ${ways}.` : `This letter was sent for ${shop.name}.`;
}
