import type { JobStage } from '@bookmatch/common/jobs/jobs-contract';
import { Column, Entity, ForeignKey, Index } from 'typeorm';
import {
  cents,
  date,
  flag,
  id,
  instant,
  line,
  notes,
  optionalDate,
  optionalId,
  optionalInstant,
  optionalWhole,
  whole,
  word,
} from '../../platform/database/columns.js';
import { EditableRow } from '../../platform/database/rows.js';
import { Customer, Site } from '../customers/customers-public.js';
import { Estimate } from '../estimates/estimates-public.js';

/** Accepted work. Its prices and plan are those of the accepted revision, or were given by hand for repeat work. */
@Entity('job')
@Index('uq_job_number', ['shopId', 'number'], { unique: true })
@Index('uq_job_estimate', ['shopId', 'estimateId'], { unique: true })
@Index('ix_job_title', ['shopId', 'title', 'id'])
@Index('ix_job_created', ['shopId', 'createdAt', 'id'])
@Index('ix_job_install', ['shopId', 'installOrder', 'id'])
@Index('ix_job_stage', ['shopId', 'stage', 'number'])
@Index('ix_job_customer', ['shopId', 'customerId'])
@Index('ix_job_site', ['shopId', 'siteId'])
@ForeignKey(() => Customer, ['shopId', 'customerId'], ['shopId', 'id'], {
  name: 'fk_job_customer',
  onDelete: 'RESTRICT',
  onUpdate: 'NO ACTION',
})
@ForeignKey(() => Site, ['shopId', 'siteId'], ['shopId', 'id'], {
  name: 'fk_job_site',
  onDelete: 'RESTRICT',
  onUpdate: 'NO ACTION',
})
@ForeignKey(() => Estimate, ['shopId', 'estimateId'], ['shopId', 'id'], {
  name: 'fk_job_estimate',
  onDelete: 'RESTRICT',
  onUpdate: 'NO ACTION',
})
export class Job extends EditableRow {
  @Column(whole()) number!: number;
  @Column(line(120)) title!: string;
  @Column(id()) customerId!: string;
  @Column(optionalId()) siteId!: string | null;
  /** Empty for work that was taken on without an estimate. */
  @Column(optionalId()) estimateId!: string | null;
  @Column(optionalWhole()) estimateNumber!: number | null;
  @Column(optionalWhole()) revisionNumber!: number | null;
  @Column(word()) stage!: JobStage;
  @Column(instant()) stageChangedAt!: Date;
  @Column(optionalDate()) installOn!: string | null;
  /** The install date again, the end of time where there is none: lists are paged by columns that are never empty. */
  @Column(date()) installOrder!: string;
  /** When somebody was last put on the job or taken off it. */
  @Column(optionalInstant()) assignedAt!: Date | null;
  @Column(flag()) openToCrew!: boolean;
  @Column(notes()) notes!: string;
  @Column(optionalInstant()) closedAt!: Date | null;
  @Column(whole()) plannedMinutes!: number;
  // money
  @Column(cents()) contractNetCents!: number;
  @Column(cents()) contractTaxCents!: number;
  @Column(cents()) contractTotalCents!: number;
  @Column(cents()) plannedCostCents!: number;
}
