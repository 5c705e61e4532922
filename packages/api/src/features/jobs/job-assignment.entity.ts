import { Column, Entity, ForeignKey, Index } from 'typeorm';
import { id } from '../../platform/database/columns.js';
import { ShopRow } from '../../platform/database/rows.js';
import { Member } from '../shops/shops-public.js';
import { Job } from './job.entity.js';

/** A member who works on a job. */
@Entity('job_assignment')
@Index('uq_job_assignment', ['shopId', 'jobId', 'memberId'], { unique: true })
@Index('ix_job_assignment_member', ['shopId', 'memberId', 'jobId'])
@ForeignKey(() => Job, ['shopId', 'jobId'], ['shopId', 'id'], {
  name: 'fk_job_assignment_job',
  onDelete: 'RESTRICT',
  onUpdate: 'NO ACTION',
})
@ForeignKey(() => Member, ['shopId', 'memberId'], ['shopId', 'id'], {
  name: 'fk_job_assignment_member',
  onDelete: 'RESTRICT',
  onUpdate: 'NO ACTION',
})
export class JobAssignment extends ShopRow {
  @Column(id()) jobId!: string;
  @Column(id()) memberId!: string;
}
