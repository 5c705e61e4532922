import type { TimeKind, TimeSource } from '@bookmatch/common/time/time-contract';
import { Column, Entity, ForeignKey, Index } from 'typeorm';
import {
  flag,
  id,
  instant,
  line,
  optionalCents,
  optionalId,
  optionalInstant,
  optionalWhole,
  word,
} from '../../platform/database/columns.js';
import { EditableRow } from '../../platform/database/rows.js';
import { Job } from '../jobs/jobs-public.js';
import { Member, Operation } from '../shops/shops-public.js';

/** One stretch of a member's clocked time. It is open while it has no end and was not voided. */
@Entity('time_entry')
@Index('uq_time_entry_open', ['shopId', 'openMemberId'], { unique: true })
@Index('ix_time_entry_member', ['shopId', 'memberId', 'startedAt'])
@Index('ix_time_entry_started', ['shopId', 'startedAt', 'id'])
@Index('ix_time_entry_job', ['shopId', 'jobId', 'operationId', 'voidedAt', 'minutes', 'costCents'])
@Index('ix_time_entry_operation', ['shopId', 'operationId'])
@ForeignKey(() => Member, ['shopId', 'memberId'], ['shopId', 'id'], {
  name: 'fk_time_entry_member',
  onDelete: 'RESTRICT',
  onUpdate: 'NO ACTION',
})
@ForeignKey(() => Job, ['shopId', 'jobId'], ['shopId', 'id'], {
  name: 'fk_time_entry_job',
  onDelete: 'RESTRICT',
  onUpdate: 'NO ACTION',
})
@ForeignKey(() => Operation, ['shopId', 'operationId'], ['shopId', 'id'], {
  name: 'fk_time_entry_operation',
  onDelete: 'RESTRICT',
  onUpdate: 'NO ACTION',
})
export class TimeEntry extends EditableRow {
  @Column(id()) memberId!: string;
  /** Empty for time that belongs to no job. */
  @Column(optionalId()) jobId!: string | null;
  /** Empty for a meal break only. */
  @Column(optionalId()) operationId!: string | null;
  @Column(word()) kind!: TimeKind;
  @Column(instant()) startedAt!: Date;
  @Column(optionalInstant()) endedAt!: Date | null;
  /** Whole minutes from start to end; empty while there is no end. */
  @Column(optionalWhole()) minutes!: number | null;
  @Column(line(300)) note!: string;
  @Column(word()) source!: TimeSource;
  /** Somebody entered or changed it after the fact. */
  @Column(flag()) corrected!: boolean;
  @Column(optionalInstant()) voidedAt!: Date | null;
  // money
  /** What an hour of the member cost when the entry began; empty where nobody had said. */
  @Column(optionalCents()) laborCostCentsPerHour!: number | null;
  /** What the minutes cost at that; empty while there is no end, and where nobody had said. */
  @Column(optionalCents()) costCents!: number | null;
  /** The member while the entry is open: unique, so that the database itself lets nobody be clocked in twice. */
  @Column({
    type: 'uuid',
    nullable: true,
    asExpression: 'if(`ended_at` is null and `voided_at` is null,`member_id`,NULL)',
    generatedType: 'STORED',
    insert: false,
    update: false,
    select: false,
  })
  readonly openMemberId?: string | null;
}
