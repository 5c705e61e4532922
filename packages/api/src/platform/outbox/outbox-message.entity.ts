import { Column, Entity, Index } from 'typeorm';
import {
  document,
  instant,
  optionalId,
  optionalInstant,
  optionalLine,
  whole,
  word,
} from '../database/columns.js';
import { GlobalRow } from '../database/rows.js';

/** Something that must leave the building, written in the transaction of its cause. */
@Entity('outbox_message')
@Index('ix_outbox_due', ['finishedAt', 'dueAt'])
@Index('ix_outbox_shop', ['shopId', 'id'])
export class OutboxMessage extends GlobalRow {
  @Column(optionalId()) shopId!: string | null;
  @Column(word()) kind!: string;
  @Column(document()) payload!: unknown;
  @Column(whole()) attempts!: number;
  /** Not before this. While a worker holds the message it lies a little ahead, so that a dead worker's work is taken over. */
  @Column(instant()) dueAt!: Date;
  /** When it was done, or given up. */
  @Column(optionalInstant()) finishedAt!: Date | null;
  @Column(optionalInstant()) givenUpAt!: Date | null;
  @Column(optionalLine(500)) lastError!: string | null;
}
