import type { JobStage } from '@bookmatch/common/jobs/jobs-contract';
import { Column, Entity, ForeignKey, Index } from 'typeorm';
import { id, line, optionalId, optionalWord, word } from '../../platform/database/columns.js';
import { ShopRow } from '../../platform/database/rows.js';
import { Member } from '../shops/shops-public.js';
import { Job } from './job.entity.js';

/** A step of a job from stage to stage. Only added to. */
@Entity('job_stage_change')
@Index('ix_job_stage_change_job', ['shopId', 'jobId', 'id'])
@Index('ix_job_stage_change_member', ['shopId', 'memberId'])
@ForeignKey(() => Job, ['shopId', 'jobId'], ['shopId', 'id'], {
  name: 'fk_job_stage_change_job',
  onDelete: 'RESTRICT',
  onUpdate: 'NO ACTION',
})
@ForeignKey(() => Member, ['shopId', 'memberId'], ['shopId', 'id'], {
  name: 'fk_job_stage_change_member',
  onDelete: 'RESTRICT',
  onUpdate: 'NO ACTION',
})
export class JobStageChange extends ShopRow {
  @Column(id()) jobId!: string;
  /** Empty for the first: where the job began. */
  @Column(optionalWord()) fromStage!: JobStage | null;
  @Column(word()) toStage!: JobStage;
  /** Empty when the customer's acceptance made the job. */
  @Column(optionalId()) memberId!: string | null;
  /** Why the job was closed although its last stage is not billed. */
  @Column(line(300)) reason!: string;
}
