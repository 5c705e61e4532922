import type { TimeCategory } from '@bookmatch/common/estimates/cost-categories';
import { Column, Entity, ForeignKey, Index } from 'typeorm';
import { flag, line, optionalCents, optionalInstant, whole, word } from '../../platform/database/columns.js';
import { EditableRow } from '../../platform/database/rows.js';
import { Shop } from './shop.entity.js';

/** A kind of work that time is planned and clocked against. One that was used is archived, never removed. */
@Entity('operation')
@Index('uq_operation_name', ['shopId', 'name'], { unique: true })
@ForeignKey(() => Shop, ['shopId'], ['id'], {
  name: 'fk_operation_shop',
  onDelete: 'RESTRICT',
  onUpdate: 'NO ACTION',
})
export class Operation extends EditableRow {
  @Column(line(80)) name!: string;
  /** Counted from 1, in the order the work goes through the shop. */
  @Column(whole()) position!: number;
  /** The row of a job's costs that time clocked to it falls in. */
  @Column(word()) costCategory!: TimeCategory;
  /** False for time that belongs to no job. */
  @Column(flag()) onJob!: boolean;
  @Column(optionalInstant()) archivedAt!: Date | null;
  // money
  /** What an hour of it is planned to cost. */
  @Column(optionalCents()) defaultRateCentsPerHour!: number | null;
}
