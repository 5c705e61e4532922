import type { InvoiceDocumentKind } from '@bookmatch/common/invoices/invoices-contract';
import { Column, Entity, ForeignKey, Index } from 'typeorm';
import { id, line, optionalId, word } from '../../platform/database/columns.js';
import { ShopRow } from '../../platform/database/rows.js';
import { Member } from '../shops/shops-public.js';
import { Invoice } from './invoice.entity.js';

/** A letter that went to the customer about an invoice. Only added to. */
@Entity('invoice_letter')
@Index('ix_invoice_letter_invoice', ['shopId', 'invoiceId', 'id'])
@Index('ix_invoice_letter_member', ['shopId', 'memberId'])
@ForeignKey(() => Invoice, ['shopId', 'invoiceId'], ['shopId', 'id'], {
  name: 'fk_invoice_letter_invoice',
  onDelete: 'RESTRICT',
  onUpdate: 'NO ACTION',
})
@ForeignKey(() => Member, ['shopId', 'memberId'], ['shopId', 'id'], {
  name: 'fk_invoice_letter_member',
  onDelete: 'RESTRICT',
  onUpdate: 'NO ACTION',
})
export class InvoiceLetter extends ShopRow {
  @Column(id()) invoiceId!: string;
  /** What the letter carried: the invoice, a credit note of it, or the receipt of a payment. */
  @Column(word()) document!: InvoiceDocumentKind;
  @Column(id()) documentId!: string;
  /** The address it went to. */
  @Column(line(254)) recipient!: string;
  /** Empty when the system sent it by itself: the receipt of a card payment. */
  @Column(optionalId()) memberId!: string | null;
}
