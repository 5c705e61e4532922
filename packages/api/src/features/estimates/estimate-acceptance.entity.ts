import { Column, Entity, ForeignKey, Index } from 'typeorm';
import { id, line } from '../../platform/database/columns.js';
import { ShopRow } from '../../platform/database/rows.js';
import { EstimateRevision } from './estimate-revision.entity.js';
import { Estimate } from './estimate.entity.js';

/** Who accepted what, and when: `createdAt`. One for an estimate, never changed, with all it takes to prove it. */
@Entity('estimate_acceptance')
@Index('uq_estimate_acceptance_estimate', ['shopId', 'estimateId'], { unique: true })
@Index('ix_estimate_acceptance_revision', ['shopId', 'revisionId'])
@ForeignKey(() => Estimate, ['shopId', 'estimateId'], ['shopId', 'id'], {
  name: 'fk_estimate_acceptance_estimate',
  onDelete: 'RESTRICT',
  onUpdate: 'NO ACTION',
})
@ForeignKey(() => EstimateRevision, ['shopId', 'revisionId'], ['shopId', 'id'], {
  name: 'fk_estimate_acceptance_revision',
  onDelete: 'RESTRICT',
  onUpdate: 'NO ACTION',
})
export class EstimateAcceptance extends ShopRow {
  @Column(id()) estimateId!: string;
  @Column(id()) revisionId!: string;
  /** The link it came through. */
  @Column(id()) linkId!: string;
  /** The name as the customer typed it. */
  @Column(line(120)) name!: string;
  /** The network address it came from. */
  @Column(line(45)) address!: string;
  @Column(line(300)) userAgent!: string;
  /** The canonical text that was accepted. */
  @Column({ type: 'mediumtext' }) document!: string;
  /** SHA-256, hex, of that text. */
  @Column(line(64)) documentHash!: string;
}
