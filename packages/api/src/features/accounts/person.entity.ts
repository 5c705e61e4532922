import { Column, Entity, Index } from 'typeorm';
import { line, optionalInstant } from '../../platform/database/columns.js';
import { GlobalRow } from '../../platform/database/rows.js';

/** Somebody who can sign in. Belongs to shops through memberships. */
@Entity('person')
@Index('uq_person_email', ['email'], { unique: true })
export class Person extends GlobalRow {
  /** Lower case. */
  @Column(line(254)) email!: string;
  @Column(line(120)) name!: string;
  @Column(line(200)) passwordHash!: string;
  @Column(optionalInstant()) emailConfirmedAt!: Date | null;
}
