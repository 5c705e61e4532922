import { Column, Entity, ForeignKey, Index } from 'typeorm';
import { id, instant, line, optionalInstant, word } from '../../platform/database/columns.js';
import { GlobalRow } from '../../platform/database/rows.js';
import { Person } from './person.entity.js';

/** A single-use secret sent by e-mail; only its hash is kept. */
@Entity('person_token')
@Index('uq_person_token_hash', ['tokenHash'], { unique: true })
@Index('ix_person_token_person', ['personId'])
@ForeignKey(() => Person, ['personId'], ['id'], {
  name: 'fk_person_token_person',
  onDelete: 'CASCADE',
  onUpdate: 'NO ACTION',
})
export class PersonToken extends GlobalRow {
  @Column(id()) personId!: string;
  /** `confirm-email` or `reset-password`. */
  @Column(word()) purpose!: string;
  @Column(line(64)) tokenHash!: string;
  @Column(instant()) expiresAt!: Date;
  @Column(optionalInstant()) usedAt!: Date | null;
}
