import { Column, Entity, ForeignKey, Index } from 'typeorm';
import { id, notes } from '../../platform/database/columns.js';
import { ShopRow } from '../../platform/database/rows.js';
import { Member } from '../shops/shops-public.js';
import { Lead } from './lead.entity.js';

/** What somebody noted about a lead. Only added to: a memory that is not rewritten. */
@Entity('lead_note')
@Index('ix_lead_note_lead', ['shopId', 'leadId', 'id'])
@Index('ix_lead_note_member', ['shopId', 'memberId'])
@ForeignKey(() => Lead, ['shopId', 'leadId'], ['shopId', 'id'], {
  name: 'fk_lead_note_lead',
  onDelete: 'RESTRICT',
  onUpdate: 'NO ACTION',
})
@ForeignKey(() => Member, ['shopId', 'memberId'], ['shopId', 'id'], {
  name: 'fk_lead_note_member',
  onDelete: 'RESTRICT',
  onUpdate: 'NO ACTION',
})
export class LeadNote extends ShopRow {
  @Column(id()) leadId!: string;
  @Column(id()) memberId!: string;
  @Column(notes()) body!: string;
}
