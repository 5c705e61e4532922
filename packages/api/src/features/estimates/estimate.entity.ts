import type { EstimateStatus } from '@bookmatch/common/estimates/estimates-contract';
import { Column, Entity, ForeignKey, Index } from 'typeorm';
import { id, line, optionalId, optionalInstant, whole, word } from '../../platform/database/columns.js';
import { EditableRow } from '../../platform/database/rows.js';
import { Customer, Site } from '../customers/customers-public.js';
import { Lead } from '../leads/leads-public.js';

/** The priced offer. Its price stands in its revisions. */
@Entity('estimate')
@Index('uq_estimate_number', ['shopId', 'number'], { unique: true })
@Index('ix_estimate_title', ['shopId', 'title', 'id'])
@Index('ix_estimate_created', ['shopId', 'createdAt', 'id'])
@Index('ix_estimate_status', ['shopId', 'status', 'number'])
@Index('ix_estimate_customer', ['shopId', 'customerId'])
@Index('ix_estimate_site', ['shopId', 'siteId'])
@Index('ix_estimate_lead', ['shopId', 'leadId'])
@ForeignKey(() => Customer, ['shopId', 'customerId'], ['shopId', 'id'], {
  name: 'fk_estimate_customer',
  onDelete: 'RESTRICT',
  onUpdate: 'NO ACTION',
})
@ForeignKey(() => Site, ['shopId', 'siteId'], ['shopId', 'id'], {
  name: 'fk_estimate_site',
  onDelete: 'RESTRICT',
  onUpdate: 'NO ACTION',
})
@ForeignKey(() => Lead, ['shopId', 'leadId'], ['shopId', 'id'], {
  name: 'fk_estimate_lead',
  onDelete: 'RESTRICT',
  onUpdate: 'NO ACTION',
})
export class Estimate extends EditableRow {
  @Column(whole()) number!: number;
  @Column(line(120)) title!: string;
  @Column(id()) customerId!: string;
  @Column(optionalId()) siteId!: string | null;
  @Column(optionalId()) leadId!: string | null;
  /** From the revisions, for lists; `expired` is never stored. */
  @Column(word()) status!: Exclude<EstimateStatus, 'expired'>;
  /** When the last valid day ends of the revision that was sent and not answered: by this lists tell `expired`. */
  @Column(optionalInstant()) openUntil!: Date | null;
  /** The accepted revision, or else the newest: the one that lists and the editor show. */
  @Column(whole()) currentRevisionNumber!: number;
}
