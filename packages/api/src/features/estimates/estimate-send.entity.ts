import { Column, Entity, ForeignKey, Index } from 'typeorm';
import { id, line, notes } from '../../platform/database/columns.js';
import { ShopRow } from '../../platform/database/rows.js';
import { EstimateRevision } from './estimate-revision.entity.js';
import { Estimate } from './estimate.entity.js';

/** A letter with which a revision went to the customer. */
@Entity('estimate_send')
@Index('ix_estimate_send_estimate', ['shopId', 'estimateId', 'createdAt'])
@Index('ix_estimate_send_revision', ['shopId', 'revisionId'])
@ForeignKey(() => Estimate, ['shopId', 'estimateId'], ['shopId', 'id'], {
  name: 'fk_estimate_send_estimate',
  onDelete: 'RESTRICT',
  onUpdate: 'NO ACTION',
})
@ForeignKey(() => EstimateRevision, ['shopId', 'revisionId'], ['shopId', 'id'], {
  name: 'fk_estimate_send_revision',
  onDelete: 'RESTRICT',
  onUpdate: 'NO ACTION',
})
export class EstimateSend extends ShopRow {
  @Column(id()) estimateId!: string;
  @Column(id()) revisionId!: string;
  @Column(line(254)) to!: string;
  @Column(notes()) message!: string;
}
