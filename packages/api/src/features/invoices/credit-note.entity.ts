import { Column, Entity, ForeignKey, Index } from 'typeorm';
import { cents, date, id, notes, whole } from '../../platform/database/columns.js';
import { ShopRow } from '../../platform/database/rows.js';
import { Member } from '../shops/shops-public.js';
import { Invoice } from './invoice.entity.js';

/** What is taken off an issued invoice, whole or in part. Never changed: the application may only read and insert here. */
@Entity('credit_note')
@Index('uq_credit_note_number', ['shopId', 'number'], { unique: true })
@Index('ix_credit_note_invoice', ['shopId', 'invoiceId', 'id'])
@Index('ix_credit_note_member', ['shopId', 'memberId'])
@ForeignKey(() => Invoice, ['shopId', 'invoiceId'], ['shopId', 'id'], {
  name: 'fk_credit_note_invoice',
  onDelete: 'RESTRICT',
  onUpdate: 'NO ACTION',
})
@ForeignKey(() => Member, ['shopId', 'memberId'], ['shopId', 'id'], {
  name: 'fk_credit_note_member',
  onDelete: 'RESTRICT',
  onUpdate: 'NO ACTION',
})
export class CreditNote extends ShopRow {
  @Column(id()) invoiceId!: string;
  @Column(whole()) number!: number;
  @Column(date()) issuedOn!: string;
  @Column(cents()) netCents!: number;
  @Column(cents()) taxCents!: number;
  @Column(cents()) amountCents!: number;
  @Column(notes()) reason!: string;
  @Column(id()) memberId!: string;
}
