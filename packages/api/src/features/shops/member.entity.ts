import type { Role } from '@bookmatch/common/access/roles';
import { Column, Entity, ForeignKey, Index } from 'typeorm';
import { id, optionalCents, optionalInstant, word } from '../../platform/database/columns.js';
import { EditableRow } from '../../platform/database/rows.js';
import { Person } from '../accounts/accounts-public.js';
import { Shop } from './shop.entity.js';

/** A person's place in a shop, with one role. A member who left keeps the row: their time entries point at it. */
@Entity('member')
@Index('uq_member_person', ['shopId', 'personId'], { unique: true })
@Index('ix_member_person', ['personId'])
@ForeignKey(() => Shop, ['shopId'], ['id'], {
  name: 'fk_member_shop',
  onDelete: 'RESTRICT',
  onUpdate: 'NO ACTION',
})
@ForeignKey(() => Person, ['personId'], ['id'], {
  name: 'fk_member_person',
  onDelete: 'RESTRICT',
  onUpdate: 'NO ACTION',
})
export class Member extends EditableRow {
  @Column(id()) personId!: string;
  @Column(word()) role!: Role;
  /** What an hour of this member costs the shop, for job costing. Not the pay rate of payroll. */
  @Column(optionalCents()) laborCostCentsPerHour!: number | null;
  @Column(optionalInstant()) removedAt!: Date | null;
}
