import { applyReceived, refuseRefund, refuseReversal } from '@bookmatch/common/invoices/overpayment-rules';
import { refusePayment } from '@bookmatch/common/invoices/payment-rules';
import type {
  RecordPayment,
  RefundOverpayment,
  ReversePayment,
} from '@bookmatch/common/invoices/invoices-contract';
import { postPayment, postRefund, postReversal } from '@bookmatch/common/ledger/postings';
import type { ShopScope } from '../../platform/database/scope.js';
import { notFound, refuse } from '../../platform/http/problem-error.js';
import { openBooks, postEntry } from '../ledger/ledger-public.js';
import { shopOf, todayAt, todayOf } from '../shops/shops-public.js';
import type { CardCheckout } from './card-checkout.entity.js';
import { withdrawCheckouts } from './checkout-withdrawal.js';
import { moveAmounts } from './invoice-amounts.js';
import { Invoice } from './invoice.entity.js';
import { Payment } from './payment.entity.js';

type NewPayment = Omit<Payment, 'id' | 'shopId' | 'createdAt'>;

/**
 * Money that comes in and goes out. Every act locks the invoice first, so that of many payments of one balance exactly
 * one goes through.
 */
export class PaymentsService {
  /** Records a check, cash or a transfer. @throws stale-version, conflict with the field */
  async record(scope: ShopScope, invoiceId: string, input: RecordPayment, version: number): Promise<Payment> {
    await openBooks(scope);
    const invoice = await scope.rows(Invoice).getForUpdate(invoiceId);
    const shop = await shopOf(scope);
    refuse(refusePayment({ ...invoice, currency: shop.currency }, input, todayAt(shop, scope.now)));
    const { amountCents } = input;
    await moveAmounts(scope, invoice, { paidCents: invoice.paidCents + amountCents }, version);
    await withdrawCheckouts(scope, invoiceId);
    const payment = await this.insert(scope, {
      ...NOTHING_SPECIAL,
      ...input,
      invoiceId,
      appliedCents: amountCents,
      memberId: scope.memberId,
    });
    await this.book(scope, invoice, payment);
    return payment;
  }

  /** Takes a wrongly recorded payment back by a record of its own, dated today. @throws conflict */
  async reverse(scope: ShopScope, id: string, { reason }: ReversePayment): Promise<Payment> {
    await openBooks(scope);
    const { invoiceId } = await scope.rows(Payment).get(id);
    const invoice = await scope.rows(Invoice).getForUpdate(invoiceId);
    const payments = await scope.rows(Payment).findBy({ invoiceId }, 'id', true);
    const wrong = payments.find((payment) => payment.id === id);
    if (!wrong) throw notFound('This payment');
    const reversed = payments.some(({ reversesId }) => reversesId === id);
    refuse(refuseReversal({ ...wrong, reversed }));
    await moveAmounts(scope, invoice, { paidCents: invoice.paidCents - wrong.appliedCents });
    const reversal = await this.insert(scope, {
      ...NOTHING_SPECIAL,
      invoiceId,
      kind: 'reversal',
      method: wrong.method,
      amountCents: -wrong.amountCents,
      appliedCents: -wrong.appliedCents,
      receivedOn: await todayOf(scope),
      reference: wrong.reference,
      reversesId: id,
      reason,
      memberId: scope.memberId,
    });
    await this.book(scope, invoice, reversal);
    return reversal;
  }

  /** Records that money beyond the debt went back to the customer. @throws stale-version, conflict with the field */
  async refund(
    scope: ShopScope,
    invoiceId: string,
    input: RefundOverpayment,
    version: number,
  ): Promise<Payment> {
    await openBooks(scope);
    const invoice = await scope.rows(Invoice).getForUpdate(invoiceId);
    const shop = await shopOf(scope);
    refuse(refuseRefund(invoice.overpaidCents, input, todayAt(shop, scope.now), shop.currency));
    const overpaidCents = invoice.overpaidCents - input.amountCents;
    await scope.rows(Invoice).update(invoice, { overpaidCents }, version);
    const refund = await this.insert(scope, {
      ...NOTHING_SPECIAL,
      invoiceId,
      kind: 'refund',
      method: input.method,
      amountCents: -input.amountCents,
      appliedCents: 0,
      receivedOn: input.paidOn,
      reference: input.reference,
      memberId: scope.memberId,
    });
    await this.book(scope, invoice, refund);
    return refund;
  }

  /**
   * Records what a card has paid. It is never refused, since the card was charged: what is more than is owed by now is
   * held for the customer and shown.
   */
  async receiveCard(
    scope: ShopScope,
    invoice: Invoice,
    checkout: CardCheckout,
    received: { amountCents: number; on: string; reference: string },
  ): Promise<Payment> {
    const { amountCents, on, reference } = received;
    const { appliedCents, excessCents } = applyReceived(amountCents, invoice.balanceCents);
    await moveAmounts(scope, invoice, {
      paidCents: invoice.paidCents + appliedCents,
      overpaidCents: invoice.overpaidCents + excessCents,
    });
    const payment = await this.insert(scope, {
      ...NOTHING_SPECIAL,
      invoiceId: invoice.id,
      method: 'card',
      amountCents,
      appliedCents,
      receivedOn: on,
      reference,
      checkoutId: checkout.id,
    });
    await this.book(scope, invoice, payment);
    return payment;
  }

  private insert(scope: ShopScope, payment: NewPayment): Promise<Payment> {
    return scope.rows(Payment).insert({ ...payment, id: scope.newId() });
  }

  private book(scope: ShopScope, invoice: Invoice, payment: Payment): Promise<void> {
    const { kind, method, amountCents, appliedCents } = payment;
    const amount = Math.abs(amountCents);
    const posting = {
      payment: () => postPayment(method, amount, invoice, amountCents - appliedCents),
      reversal: () => postReversal(method, amount, invoice),
      refund: () => postRefund(method, amount, invoice),
    }[kind];
    return postEntry(scope, {
      kind: ENTRY_KINDS[kind],
      on: payment.receivedOn,
      memo: `${MEMOS[kind]} invoice ${invoice.number}`,
      source: { kind: 'payment', id: payment.id },
      invoiceId: invoice.id,
      lines: posting(),
    });
  }
}

const NOTHING_SPECIAL = {
  kind: 'payment',
  reversesId: null,
  checkoutId: null,
  reason: '',
  memberId: null,
} as const;
const ENTRY_KINDS = { payment: 'payment', reversal: 'payment-reversal', refund: 'refund' } as const;
const MEMOS = {
  payment: 'Payment of',
  reversal: 'Payment taken back on',
  refund: 'Overpayment given back on',
} as const;
