import type { CostCategory } from '@bookmatch/common/estimates/cost-categories';
import { Column, Entity, ForeignKey, Index } from 'typeorm';
import { cents, id, word } from '../../platform/database/columns.js';
import { ShopRow } from '../../platform/database/rows.js';
import { Job } from './job.entity.js';

/** What a job is planned to cost in one category. */
@Entity('job_planned_cost')
@Index('uq_job_planned_cost', ['shopId', 'jobId', 'category'], { unique: true })
@ForeignKey(() => Job, ['shopId', 'jobId'], ['shopId', 'id'], {
  name: 'fk_job_planned_cost_job',
  onDelete: 'RESTRICT',
  onUpdate: 'NO ACTION',
})
export class JobPlannedCost extends ShopRow {
  @Column(id()) jobId!: string;
  @Column(word()) category!: CostCategory;
  @Column(cents()) plannedCents!: number;
}
