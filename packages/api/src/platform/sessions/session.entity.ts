import { Column, Entity, Index, PrimaryColumn } from 'typeorm';
import { id, instant, line, notes } from '../database/columns.js';

/**
 * A signed-in browser. Only rows of signed-in people exist. The cookie's session id is kept hashed, so that a copy of
 * this table signs nobody in. Read and written by the session store through Sequelize; declared here so that the schema
 * check covers it.
 */
@Entity('session')
@Index('ix_session_person', ['personId', 'lastSeenAt'])
@Index('ix_session_expires', ['expires'])
@Index('uq_session_public_id', ['publicId'], { unique: true })
export class SessionRow {
  @PrimaryColumn({ type: 'char', length: 64 }) sid!: string;
  /** What the person's own list of sessions calls it. */
  @Column(id()) publicId!: string;
  @Column(id()) personId!: string;
  @Column(notes()) data!: string;
  @Column(instant()) expires!: Date;
  @Column(instant()) createdAt!: Date;
  @Column(instant()) lastSeenAt!: Date;
  @Column(line(300)) userAgent!: string;
  @Column(line(45)) address!: string;
}
