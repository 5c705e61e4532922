import type { JobFileType } from '@bookmatch/common/jobs/job-files-contract';
import { Column, Entity, ForeignKey, Index } from 'typeorm';
import { flag, id, line, whole, word } from '../../platform/database/columns.js';
import { ShopRow } from '../../platform/database/rows.js';
import { Member } from '../shops/shops-public.js';
import { Job } from './job.entity.js';

/** A file or photo of a job. Its bytes lie in the file store under a key made of ids. */
@Entity('job_file')
@Index('uq_job_file_content', ['shopId', 'jobId', 'sha256'], { unique: true })
@Index('ix_job_file_member', ['shopId', 'memberId'])
@ForeignKey(() => Job, ['shopId', 'jobId'], ['shopId', 'id'], {
  name: 'fk_job_file_job',
  onDelete: 'RESTRICT',
  onUpdate: 'NO ACTION',
})
@ForeignKey(() => Member, ['shopId', 'memberId'], ['shopId', 'id'], {
  name: 'fk_job_file_member',
  onDelete: 'RESTRICT',
  onUpdate: 'NO ACTION',
})
export class JobFile extends ShopRow {
  @Column(id()) jobId!: string;
  /** As the person's own device called it; text only, never part of a path. */
  @Column(line(200)) name!: string;
  @Column(word()) mediaType!: JobFileType;
  @Column(whole()) bytes!: number;
  /** SHA-256 of the content, hex: the same photo sent twice is one file. */
  @Column(line(64)) sha256!: string;
  @Column(flag()) hasThumbnail!: boolean;
  @Column(id()) memberId!: string;
}
