import { Column, Entity, ForeignKey, Index } from 'typeorm';
import { cents, id, line, optionalInstant, optionalLine, word } from '../../platform/database/columns.js';
import { EditableRow } from '../../platform/database/rows.js';
import { Invoice } from './invoice.entity.js';

/**
 * `asked`: about to be made at the provider, or made without our knowing yet. `open`: the customer can pay there.
 * `withdrawn`: ours to close, since something else was paid or credited meanwhile; money may still come through it.
 */
export const CHECKOUT_STATUSES = ['asked', 'open', 'withdrawn', 'expired', 'paid'] as const;
export type CheckoutStatus = (typeof CHECKOUT_STATUSES)[number];

/** One card payment of an invoice on the provider's page. Its id is the business key of the call that makes it. */
@Entity('card_checkout')
@Index('ix_card_checkout_invoice', ['shopId', 'invoiceId', 'status'])
@Index('uq_card_checkout_session', ['shopId', 'sessionId'], { unique: true })
@ForeignKey(() => Invoice, ['shopId', 'invoiceId'], ['shopId', 'id'], {
  name: 'fk_card_checkout_invoice',
  onDelete: 'RESTRICT',
  onUpdate: 'NO ACTION',
})
export class CardCheckout extends EditableRow {
  @Column(id()) invoiceId!: string;
  /** The customer's link it was started from: its page is where the provider sends the browser back to. */
  @Column(id()) linkId!: string;
  @Column(word()) status!: CheckoutStatus;
  @Column(cents()) amountCents!: number;
  /** Filled in on the provider's page; empty when the customer has no address. Kept so that a repeated call is the same. */
  @Column(line(254)) payerEmail!: string;
  /** The shop's connected account that the money goes to. */
  @Column(line(60)) accountId!: string;
  @Column(optionalLine(120)) sessionId!: string | null;
  @Column(optionalLine(2000)) url!: string | null;
  @Column(optionalInstant()) expiresAt!: Date | null;
}
