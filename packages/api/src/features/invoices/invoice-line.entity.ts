import { Column, Entity, ForeignKey, Index } from 'typeorm';
import { cents, flag, id, line, quantity, whole } from '../../platform/database/columns.js';
import { ShopRow } from '../../platform/database/rows.js';
import { Invoice } from './invoice.entity.js';

/** One line of an invoice. */
@Entity('invoice_line')
@Index('ix_invoice_line_invoice', ['shopId', 'invoiceId', 'position'])
@ForeignKey(() => Invoice, ['shopId', 'invoiceId'], ['shopId', 'id'], {
  name: 'fk_invoice_line_invoice',
  onDelete: 'RESTRICT',
  onUpdate: 'NO ACTION',
})
export class InvoiceLine extends ShopRow {
  @Column(id()) invoiceId!: string;
  @Column(whole()) position!: number;
  @Column(line(300)) description!: string;
  @Column(quantity()) quantity!: string;
  @Column(cents()) unitPriceCents!: number;
  @Column(flag()) taxable!: boolean;
  /** Quantity × unit price, half-up to the cent. */
  @Column(cents()) amountCents!: number;
}
