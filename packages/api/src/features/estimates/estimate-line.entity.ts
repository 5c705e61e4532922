import type { CostCategory } from '@bookmatch/common/estimates/cost-categories';
import type { QuantityUnit } from '@bookmatch/common/estimates/revision-contract';
import { Column, Entity, ForeignKey, Index } from 'typeorm';
import {
  cents,
  decimal,
  flag,
  id,
  line,
  optionalId,
  quantity,
  whole,
  word,
} from '../../platform/database/columns.js';
import { ShopRow } from '../../platform/database/rows.js';
import { Operation } from '../shops/shops-public.js';
import { EstimateRevision } from './estimate-revision.entity.js';
import { EstimateRoom } from './estimate-room.entity.js';

/** A priced line of a room. */
@Entity('estimate_line')
@Index('ix_estimate_line_revision', ['shopId', 'revisionId', 'position'])
@Index('ix_estimate_line_room', ['shopId', 'roomId'])
@Index('ix_estimate_line_operation', ['shopId', 'operationId'])
@ForeignKey(() => EstimateRevision, ['shopId', 'revisionId'], ['shopId', 'id'], {
  name: 'fk_estimate_line_revision',
  onDelete: 'RESTRICT',
  onUpdate: 'NO ACTION',
})
@ForeignKey(() => EstimateRoom, ['shopId', 'roomId'], ['shopId', 'id'], {
  name: 'fk_estimate_line_room',
  onDelete: 'RESTRICT',
  onUpdate: 'NO ACTION',
})
@ForeignKey(() => Operation, ['shopId', 'operationId'], ['shopId', 'id'], {
  name: 'fk_estimate_line_operation',
  onDelete: 'RESTRICT',
  onUpdate: 'NO ACTION',
})
export class EstimateLine extends ShopRow {
  @Column(id()) revisionId!: string;
  @Column(id()) roomId!: string;
  @Column(whole()) position!: number;
  @Column(word()) kind!: CostCategory;
  @Column(line(300)) description!: string;
  @Column(quantity()) quantity!: string;
  @Column(word()) unit!: QuantityUnit;
  @Column(cents()) unitCostCents!: number;
  @Column(cents()) unitPriceCents!: number;
  @Column(optionalId()) operationId!: string | null;
  @Column({ ...decimal(12, 3), nullable: true }) plannedMinutesPerUnit!: string | null;
  @Column(flag()) taxable!: boolean;
}
