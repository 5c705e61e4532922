import { Column, Entity, ForeignKey, Index } from 'typeorm';
import { cents, id, whole } from '../../platform/database/columns.js';
import { ShopRow } from '../../platform/database/rows.js';
import { Operation } from '../shops/shops-public.js';
import { Job } from './job.entity.js';

/** What an operation of a job is planned to take. */
@Entity('job_operation')
@Index('uq_job_operation', ['shopId', 'jobId', 'operationId'], { unique: true })
@Index('ix_job_operation_operation', ['shopId', 'operationId'])
@ForeignKey(() => Job, ['shopId', 'jobId'], ['shopId', 'id'], {
  name: 'fk_job_operation_job',
  onDelete: 'RESTRICT',
  onUpdate: 'NO ACTION',
})
@ForeignKey(() => Operation, ['shopId', 'operationId'], ['shopId', 'id'], {
  name: 'fk_job_operation_operation',
  onDelete: 'RESTRICT',
  onUpdate: 'NO ACTION',
})
export class JobOperation extends ShopRow {
  @Column(id()) jobId!: string;
  @Column(id()) operationId!: string;
  @Column(whole()) plannedMinutes!: number;
  // money
  @Column(cents()) plannedCostCents!: number;
}
