import type { PaymentKind, PaymentMethod } from '@bookmatch/common/invoices/invoice-standings';
import { Column, Entity, ForeignKey, Index } from 'typeorm';
import { cents, date, id, line, notes, optionalId, word } from '../../platform/database/columns.js';
import { ShopRow } from '../../platform/database/rows.js';
import { Member } from '../shops/shops-public.js';
import { CardCheckout } from './card-checkout.entity.js';
import { Invoice } from './invoice.entity.js';

/**
 * Money that came in for an invoice, a wrong record taken back, or what was too much given back. Never changed: the
 * application's database account may only read and insert here.
 */
@Entity('payment')
@Index('ix_payment_invoice', ['shopId', 'invoiceId', 'id'])
@Index('ix_payment_received', ['shopId', 'receivedOn', 'id'])
@Index('uq_payment_reverses', ['shopId', 'reversesId'], { unique: true })
@Index('uq_payment_checkout', ['shopId', 'checkoutId'], { unique: true })
@Index('ix_payment_member', ['shopId', 'memberId'])
@ForeignKey(() => Invoice, ['shopId', 'invoiceId'], ['shopId', 'id'], {
  name: 'fk_payment_invoice',
  onDelete: 'RESTRICT',
  onUpdate: 'NO ACTION',
})
@ForeignKey(() => Payment, ['shopId', 'reversesId'], ['shopId', 'id'], {
  name: 'fk_payment_reverses',
  onDelete: 'RESTRICT',
  onUpdate: 'NO ACTION',
})
@ForeignKey(() => CardCheckout, ['shopId', 'checkoutId'], ['shopId', 'id'], {
  name: 'fk_payment_checkout',
  onDelete: 'RESTRICT',
  onUpdate: 'NO ACTION',
})
@ForeignKey(() => Member, ['shopId', 'memberId'], ['shopId', 'id'], {
  name: 'fk_payment_member',
  onDelete: 'RESTRICT',
  onUpdate: 'NO ACTION',
})
export class Payment extends ShopRow {
  @Column(id()) invoiceId!: string;
  @Column(word()) kind!: PaymentKind;
  @Column(word()) method!: PaymentMethod;
  /** Below zero in a reversal and in a refund. */
  @Column(cents()) amountCents!: number;
  /** The part of the amount that pays the invoice; the rest was more than was owed and is held for the customer. */
  @Column(cents()) appliedCents!: number;
  /** The day the money came or went, in the shop's zone. */
  @Column(date()) receivedOn!: string;
  @Column(line(80)) reference!: string;
  /** The payment this one takes back. Unique, so that a payment is taken back once. */
  @Column(optionalId()) reversesId!: string | null;
  /** The card checkout that brought the money. Unique, so that a checkout is settled once. */
  @Column(optionalId()) checkoutId!: string | null;
  /** Why it was taken back; empty otherwise. */
  @Column(notes()) reason!: string;
  /** Empty when the payment provider's word recorded it. */
  @Column(optionalId()) memberId!: string | null;
}
