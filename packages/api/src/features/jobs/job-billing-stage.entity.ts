import type { BillingDue, BillingShare } from '@bookmatch/common/estimates/billing-schedule-contract';
import { Column, Entity, ForeignKey, Index } from 'typeorm';
import { cents, document, flag, id, line, optionalId, whole, word } from '../../platform/database/columns.js';
import { ShopRow } from '../../platform/database/rows.js';
import { Job } from './job.entity.js';

/** One stage of the accepted billing schedule. Its amounts were agreed with the customer and never change. */
@Entity('job_billing_stage')
@Index('uq_job_billing_stage', ['shopId', 'jobId', 'position'], { unique: true })
@Index('uq_job_billing_stage_invoice', ['shopId', 'invoiceId'], { unique: true })
@ForeignKey(() => Job, ['shopId', 'jobId'], ['shopId', 'id'], {
  name: 'fk_job_billing_stage_job',
  onDelete: 'RESTRICT',
  onUpdate: 'NO ACTION',
})
export class JobBillingStage extends ShopRow {
  @Column(id()) jobId!: string;
  @Column(whole()) position!: number;
  @Column(line(80)) name!: string;
  @Column(document()) share!: BillingShare;
  @Column(flag()) deposit!: boolean;
  @Column(word()) due!: BillingDue;
  // money
  @Column(cents()) netCents!: number;
  @Column(cents()) taxCents!: number;
  @Column(cents()) totalCents!: number;
  /**
   * The invoice that bills the stage, draft or issued. Invoices stand above jobs and point down at the stage, where the
   * foreign key is; this is the same fact for who reads the job, and keeps a stage from being billed twice.
   */
  @Column(optionalId()) invoiceId!: string | null;
}
