import type { InvoiceKind, InvoiceStatus } from '@bookmatch/common/invoices/invoice-standings';
import { Column, Entity, ForeignKey, Index } from 'typeorm';
import {
  cents,
  date,
  id,
  notes,
  optionalDate,
  optionalDocument,
  optionalId,
  optionalWhole,
  rate,
  whole,
  word,
} from '../../platform/database/columns.js';
import { EditableRow } from '../../platform/database/rows.js';
import { Customer } from '../customers/customers-public.js';
import { Job, JobBillingStage } from '../jobs/jobs-public.js';
import type { IssuedFrame } from './issued-frame.js';

/**
 * What a customer is asked to pay. Once issued, its lines, amounts, dates and frame never change; only what was paid
 * and credited moves, each by a record of its own.
 */
@Entity('invoice')
@Index('uq_invoice_number', ['shopId', 'number'], { unique: true })
@Index('ix_invoice_order', ['shopId', 'numberOrder', 'id'])
@Index('ix_invoice_due', ['shopId', 'status', 'dueOrder', 'balanceCents', 'customerId'])
@Index('ix_invoice_issued', ['shopId', 'issuedOrder', 'id'])
@Index('ix_invoice_created', ['shopId', 'createdAt', 'id'])
@Index('ix_invoice_customer', ['shopId', 'customerId', 'numberOrder'])
@Index('ix_invoice_job', ['shopId', 'jobId', 'numberOrder'])
@Index('ix_invoice_stage', ['shopId', 'billingStageId'])
@ForeignKey(() => Customer, ['shopId', 'customerId'], ['shopId', 'id'], {
  name: 'fk_invoice_customer',
  onDelete: 'RESTRICT',
  onUpdate: 'NO ACTION',
})
@ForeignKey(() => Job, ['shopId', 'jobId'], ['shopId', 'id'], {
  name: 'fk_invoice_job',
  onDelete: 'RESTRICT',
  onUpdate: 'NO ACTION',
})
@ForeignKey(() => JobBillingStage, ['shopId', 'billingStageId'], ['shopId', 'id'], {
  name: 'fk_invoice_stage',
  onDelete: 'RESTRICT',
  onUpdate: 'NO ACTION',
})
export class Invoice extends EditableRow {
  /** Empty until it is issued. */
  @Column(optionalWhole()) number!: number | null;
  /** The number again, for lists, which are paged by columns that are never empty: drafts come after every number. */
  @Column(whole()) numberOrder!: number;
  @Column(word()) kind!: InvoiceKind;
  @Column(word()) status!: InvoiceStatus;
  @Column(id()) customerId!: string;
  @Column(optionalId()) jobId!: string | null;
  @Column(optionalId()) billingStageId!: string | null;
  @Column(optionalDate()) issuedOn!: string | null;
  /** In a draft: the date somebody chose, or empty for the shop's usual days. */
  @Column(optionalDate()) dueOn!: string | null;
  /** Both dates again, the end of time where there is none. */
  @Column(date()) issuedOrder!: string;
  @Column(date()) dueOrder!: string;
  /** The rate on taxable lines; zero and unused where the tax is the billing stage's agreed share. */
  @Column(rate()) taxRate!: string;
  @Column(cents()) netCents!: number;
  @Column(cents()) taxCents!: number;
  @Column(cents()) totalCents!: number;
  /** What was paid of it and not reversed; never more than the total. */
  @Column(cents()) paidCents!: number;
  @Column(cents()) creditedCents!: number;
  /** What is owed: total less paid less credited, and zero while it is a draft. */
  @Column(cents()) balanceCents!: number;
  /** What came by card beyond what was owed, and was not given back yet. */
  @Column(cents()) overpaidCents!: number;
  /** The day a deposit turned into sales. */
  @Column(optionalDate()) depositEarnedOn!: string | null;
  @Column(notes()) memo!: string;
  /** Who billed whom for what, as it stood on the day of issue. */
  @Column(optionalDocument()) frame!: IssuedFrame | null;
}
