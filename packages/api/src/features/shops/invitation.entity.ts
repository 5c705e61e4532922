import type { Role } from '@bookmatch/common/access/roles';
import { Column, Entity, ForeignKey, Index } from 'typeorm';
import { id, instant, line, optionalInstant, optionalLine, word } from '../../platform/database/columns.js';
import { ShopRow } from '../../platform/database/rows.js';
import { Member } from './member.entity.js';

/** A place in the shop that is held for somebody at an address. The secret of its link is kept hashed. */
@Entity('invitation')
@Index('uq_invitation_open', ['shopId', 'openEmail'], { unique: true })
@Index('uq_invitation_token', ['tokenHash'], { unique: true })
@Index('ix_invitation_inviter', ['shopId', 'invitedByMemberId'])
@ForeignKey(() => Member, ['shopId', 'invitedByMemberId'], ['shopId', 'id'], {
  name: 'fk_invitation_inviter',
  onDelete: 'RESTRICT',
  onUpdate: 'NO ACTION',
})
export class Invitation extends ShopRow {
  /** Lower case. */
  @Column(line(254)) email!: string;
  /** The address while the invitation is open, then empty: one open invitation an address. */
  @Column(optionalLine(254)) openEmail!: string | null;
  @Column(word()) role!: Role;
  @Column(line(64)) tokenHash!: string;
  @Column(id()) invitedByMemberId!: string;
  @Column(instant()) sentAt!: Date;
  @Column(instant()) expiresAt!: Date;
  @Column(optionalInstant()) acceptedAt!: Date | null;
  @Column(optionalInstant()) withdrawnAt!: Date | null;
}
