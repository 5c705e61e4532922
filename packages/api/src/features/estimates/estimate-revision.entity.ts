import type { AcceptedDocument } from '@bookmatch/common/estimates/accepted-document-contract';
import type { RevisionStatus } from '@bookmatch/common/estimates/revision-contract';
import type { TaxRule } from '@bookmatch/common/estimates/tax-rules';
import { Column, Entity, ForeignKey, Index } from 'typeorm';
import {
  cents,
  date,
  id,
  instant,
  notes,
  optionalDocument,
  optionalInstant,
  optionalLine,
  rate,
  whole,
  word,
} from '../../platform/database/columns.js';
import { EditableRow } from '../../platform/database/rows.js';
import { Estimate } from './estimate.entity.js';

/** One version of an estimate's content. From sending on it never changes but in its status. */
@Entity('estimate_revision')
@Index('uq_estimate_revision_number', ['shopId', 'estimateId', 'number'], { unique: true })
@ForeignKey(() => Estimate, ['shopId', 'estimateId'], ['shopId', 'id'], {
  name: 'fk_estimate_revision_estimate',
  onDelete: 'RESTRICT',
  onUpdate: 'NO ACTION',
})
export class EstimateRevision extends EditableRow {
  @Column(id()) estimateId!: string;
  @Column(whole()) number!: number;
  @Column(word()) status!: RevisionStatus;
  @Column(date()) validUntil!: string;
  @Column(word()) taxRule!: TaxRule;
  @Column(rate()) taxRate!: string;
  @Column(notes()) intro!: string;
  @Column(notes()) terms!: string;
  @Column(notes()) exclusions!: string;
  @Column(cents()) discountCents!: number;
  // What the rules made of the content when it was saved.
  @Column(cents()) netCents!: number;
  @Column(cents()) taxCents!: number;
  @Column(cents()) totalCents!: number;
  @Column(cents()) plannedCostCents!: number;
  /** When the content last changed: the version goes up also when only a line did. */
  @Column(instant()) savedAt!: Date;
  @Column(optionalInstant()) sentAt!: Date | null;
  /** What the customer reads, as it was when it was sent. */
  @Column(optionalDocument()) document!: AcceptedDocument | null;
  /** SHA-256, hex, of the document's canonical text. */
  @Column(optionalLine(64)) documentHash!: string | null;
  @Column(notes()) declineReason!: string;
}
