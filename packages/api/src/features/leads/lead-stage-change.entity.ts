import type { LeadStage } from '@bookmatch/common/leads/leads-contract';
import { Column, Entity, ForeignKey, Index } from 'typeorm';
import { id, optionalId, optionalWord, word } from '../../platform/database/columns.js';
import { ShopRow } from '../../platform/database/rows.js';
import { Member } from '../shops/shops-public.js';
import { Lead } from './lead.entity.js';

/** A step of a lead from stage to stage. Only added to. */
@Entity('lead_stage_change')
@Index('ix_lead_stage_change_lead', ['shopId', 'leadId', 'id'])
@Index('ix_lead_stage_change_member', ['shopId', 'memberId'])
@ForeignKey(() => Lead, ['shopId', 'leadId'], ['shopId', 'id'], {
  name: 'fk_lead_stage_change_lead',
  onDelete: 'RESTRICT',
  onUpdate: 'NO ACTION',
})
@ForeignKey(() => Member, ['shopId', 'memberId'], ['shopId', 'id'], {
  name: 'fk_lead_stage_change_member',
  onDelete: 'RESTRICT',
  onUpdate: 'NO ACTION',
})
export class LeadStageChange extends ShopRow {
  @Column(id()) leadId!: string;
  /** Empty for the first: how the lead came in. */
  @Column(optionalWord()) fromStage!: LeadStage | null;
  @Column(word()) toStage!: LeadStage;
  /** Empty when the customer's acceptance won the lead. */
  @Column(optionalId()) memberId!: string | null;
}
