import type { BillingDue } from '@bookmatch/common/estimates/billing-schedule-contract';
import { Column, Entity, ForeignKey, Index } from 'typeorm';
import {
  cents,
  decimal,
  flag,
  id,
  line,
  optionalCents,
  whole,
  word,
} from '../../platform/database/columns.js';
import { ShopRow } from '../../platform/database/rows.js';
import { EstimateRevision } from './estimate-revision.entity.js';

/** A stage at which the job will be invoiced. A share in percent, or an amount, or, with neither, what is left. */
@Entity('estimate_billing_stage')
@Index('ix_estimate_billing_stage_revision', ['shopId', 'revisionId', 'position'])
@ForeignKey(() => EstimateRevision, ['shopId', 'revisionId'], ['shopId', 'id'], {
  name: 'fk_estimate_billing_stage_revision',
  onDelete: 'RESTRICT',
  onUpdate: 'NO ACTION',
})
export class EstimateBillingStage extends ShopRow {
  @Column(id()) revisionId!: string;
  @Column(whole()) position!: number;
  @Column(line(80)) name!: string;
  @Column({ ...decimal(7, 3), nullable: true }) sharePercent!: string | null;
  @Column(optionalCents()) shareCents!: number | null;
  @Column(flag()) deposit!: boolean;
  @Column(word()) due!: BillingDue;
  // What it bills of the revision's price; zero while the schedule does not add up.
  @Column(cents()) netCents!: number;
  @Column(cents()) taxCents!: number;
  @Column(cents()) totalCents!: number;
}
