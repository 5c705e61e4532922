import type { Address } from '@bookmatch/common/customers/customers-contract';
import type { LeadSource, LeadStage, LostReason } from '@bookmatch/common/leads/leads-contract';
import { Column, Entity, ForeignKey, Index } from 'typeorm';
import {
  date,
  document,
  instant,
  line,
  notes,
  optionalCents,
  optionalDate,
  optionalId,
  optionalWord,
  word,
} from '../../platform/database/columns.js';
import { EditableRow } from '../../platform/database/rows.js';
import { Customer, Site } from '../customers/customers-public.js';
import { Shop } from '../shops/shops-public.js';

/** An inquiry not yet an accepted estimate. */
@Entity('lead')
@Index('ix_lead_title', ['shopId', 'title', 'id'])
@Index('ix_lead_created', ['shopId', 'createdAt', 'id'])
@Index('ix_lead_next_step', ['shopId', 'nextStepOrder', 'id'])
@Index('ix_lead_stage', ['shopId', 'stage', 'nextStepOrder', 'id'])
@Index('ix_lead_stage_changed', ['shopId', 'stage', 'stageChangedAt'])
@Index('ix_lead_customer', ['shopId', 'customerId'])
@Index('ix_lead_site', ['shopId', 'siteId'])
@ForeignKey(() => Shop, ['shopId'], ['id'], {
  name: 'fk_lead_shop',
  onDelete: 'RESTRICT',
  onUpdate: 'NO ACTION',
})
@ForeignKey(() => Customer, ['shopId', 'customerId'], ['shopId', 'id'], {
  name: 'fk_lead_customer',
  onDelete: 'RESTRICT',
  onUpdate: 'NO ACTION',
})
@ForeignKey(() => Site, ['shopId', 'siteId'], ['shopId', 'id'], {
  name: 'fk_lead_site',
  onDelete: 'RESTRICT',
  onUpdate: 'NO ACTION',
})
export class Lead extends EditableRow {
  @Column(line(120)) title!: string;
  @Column(line(120)) contactName!: string;
  @Column(line(120)) company!: string;
  @Column(line(254)) email!: string;
  @Column(line(40)) phone!: string;
  @Column(document()) siteAddress!: Address;
  @Column(word()) source!: LeadSource;
  @Column(word()) stage!: LeadStage;
  @Column(instant()) stageChangedAt!: Date;
  @Column(line(160)) nextStep!: string;
  @Column(optionalDate()) nextStepOn!: string | null;
  /** The date of the next step again, the end of time where there is none: lists are paged by columns never empty. */
  @Column(date()) nextStepOrder!: string;
  @Column(optionalId()) customerId!: string | null;
  @Column(optionalId()) siteId!: string | null;
  @Column(optionalWord()) lostReason!: LostReason | null;
  @Column(notes()) lostNote!: string;
  // money
  @Column(optionalCents()) expectedCents!: number | null;
}
