import type { CostCategory } from '@bookmatch/common/estimates/cost-categories';
import { Column, Entity, ForeignKey, Index } from 'typeorm';
import { cents, date, id, line, notes, optionalId, word } from '../../platform/database/columns.js';
import { ShopRow } from '../../platform/database/rows.js';
import { Member } from '../shops/shops-public.js';
import { Job } from './job.entity.js';

/** Money spent on a job, besides clocked time. Never changed: a wrong one is reversed by a row of the opposite amount. */
@Entity('job_cost')
@Index('ix_job_cost_job', ['shopId', 'jobId', 'category', 'amountCents'])
@Index('uq_job_cost_reverses', ['shopId', 'reversesId'], { unique: true })
@Index('ix_job_cost_member', ['shopId', 'memberId'])
@ForeignKey(() => Job, ['shopId', 'jobId'], ['shopId', 'id'], {
  name: 'fk_job_cost_job',
  onDelete: 'RESTRICT',
  onUpdate: 'NO ACTION',
})
@ForeignKey(() => JobCost, ['shopId', 'reversesId'], ['shopId', 'id'], {
  name: 'fk_job_cost_reverses',
  onDelete: 'RESTRICT',
  onUpdate: 'NO ACTION',
})
@ForeignKey(() => Member, ['shopId', 'memberId'], ['shopId', 'id'], {
  name: 'fk_job_cost_member',
  onDelete: 'RESTRICT',
  onUpdate: 'NO ACTION',
})
export class JobCost extends ShopRow {
  @Column(id()) jobId!: string;
  @Column(word()) category!: CostCategory;
  @Column(line(200)) description!: string;
  @Column(cents()) amountCents!: number;
  @Column(date()) onDate!: string;
  @Column(line(120)) supplier!: string;
  /** The cost this one takes back. Unique, so that a cost is taken back once. */
  @Column(optionalId()) reversesId!: string | null;
  @Column(notes()) reason!: string;
  @Column(id()) memberId!: string;
}
