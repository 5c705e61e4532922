import { Column, Entity, ForeignKey, Index } from 'typeorm';
import { id, line, whole } from '../../platform/database/columns.js';
import { ShopRow } from '../../platform/database/rows.js';
import { EstimateRevision } from './estimate-revision.entity.js';

/** A room of a revision. */
@Entity('estimate_room')
@Index('ix_estimate_room_revision', ['shopId', 'revisionId', 'position'])
@ForeignKey(() => EstimateRevision, ['shopId', 'revisionId'], ['shopId', 'id'], {
  name: 'fk_estimate_room_revision',
  onDelete: 'RESTRICT',
  onUpdate: 'NO ACTION',
})
export class EstimateRoom extends ShopRow {
  @Column(id()) revisionId!: string;
  @Column(whole()) position!: number;
  @Column(line(120)) name!: string;
}
