import { Column, Entity, ForeignKey, Index } from 'typeorm';
import { id, notes, optionalInstant, optionalLine } from '../../platform/database/columns.js';
import { ShopRow } from '../../platform/database/rows.js';
import { Estimate } from './estimate.entity.js';

/** A question the customer asked on the estimate's page, at `createdAt`, and the shop's answer once there is one. */
@Entity('estimate_question')
@Index('ix_estimate_question_estimate', ['shopId', 'estimateId', 'createdAt'])
@ForeignKey(() => Estimate, ['shopId', 'estimateId'], ['shopId', 'id'], {
  name: 'fk_estimate_question_estimate',
  onDelete: 'RESTRICT',
  onUpdate: 'NO ACTION',
})
export class EstimateQuestion extends ShopRow {
  @Column(id()) estimateId!: string;
  @Column(id()) linkId!: string;
  @Column(notes()) body!: string;
  @Column({ ...notes(), nullable: true }) answer!: string | null;
  /** The name of the member, as it was when they answered. */
  @Column(optionalLine(120)) answeredBy!: string | null;
  @Column(optionalInstant()) answeredAt!: Date | null;
}
