import { Column, Entity, Index, PrimaryColumn } from 'typeorm';
import { id, instant, line, whole } from '../database/columns.js';

/**
 * The answer a request with this key got. The row is written in the transaction of the work itself, so the two cannot
 * part: a second request with the key waits for the first at this primary key, then finds the answer.
 */
@Entity('idempotency_key')
@Index('ix_idempotency_key_age', ['createdAt'])
export class IdempotencyKey {
  /** The shop, or the person for requests about no shop. */
  @PrimaryColumn(id()) ownerId!: string;
  @PrimaryColumn({ type: 'varchar', length: 64 }) key!: string;
  @Column(line(64)) requestHash!: string;
  @Column(whole()) status!: number;
  @Column({ type: 'mediumtext' }) answer!: string;
  @Column(instant()) createdAt!: Date;
}
