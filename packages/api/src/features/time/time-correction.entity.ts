import type { TimeEntryFacts } from '@bookmatch/common/time/time-contract';
import { Column, Entity, ForeignKey, Index } from 'typeorm';
import { id, notes, optionalDocument } from '../../platform/database/columns.js';
import { ShopRow } from '../../platform/database/rows.js';
import { Member } from '../shops/shops-public.js';
import { TimeEntry } from './time-entry.entity.js';

/** A change of an entry after the fact: who, why, what it was and what it became. Only added to. */
@Entity('time_correction')
@Index('ix_time_correction_entry', ['shopId', 'entryId', 'createdAt'])
@Index('ix_time_correction_member', ['shopId', 'memberId'])
@ForeignKey(() => TimeEntry, ['shopId', 'entryId'], ['shopId', 'id'], {
  name: 'fk_time_correction_entry',
  onDelete: 'RESTRICT',
  onUpdate: 'NO ACTION',
})
@ForeignKey(() => Member, ['shopId', 'memberId'], ['shopId', 'id'], {
  name: 'fk_time_correction_member',
  onDelete: 'RESTRICT',
  onUpdate: 'NO ACTION',
})
export class TimeCorrection extends ShopRow {
  @Column(id()) entryId!: string;
  /** Who corrected it. */
  @Column(id()) memberId!: string;
  @Column(notes()) reason!: string;
  /** Empty on an entry that was added. */
  @Column(optionalDocument()) before!: TimeEntryFacts | null;
  /** Empty on an entry that was voided. */
  @Column(optionalDocument()) after!: TimeEntryFacts | null;
}
