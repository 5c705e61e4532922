import type { Address, CustomerKind } from '@bookmatch/common/customers/customers-contract';
import { Column, Entity, ForeignKey, Index } from 'typeorm';
import { document, flag, line, notes, optionalInstant, word } from '../../platform/database/columns.js';
import { EditableRow } from '../../platform/database/rows.js';
import { Shop } from '../shops/shops-public.js';

/** Who pays. */
@Entity('customer')
@Index('ix_customer_name', ['shopId', 'name', 'id'])
@Index('ix_customer_created', ['shopId', 'createdAt', 'id'])
@ForeignKey(() => Shop, ['shopId'], ['id'], {
  name: 'fk_customer_shop',
  onDelete: 'RESTRICT',
  onUpdate: 'NO ACTION',
})
export class Customer extends EditableRow {
  @Column(word()) kind!: CustomerKind;
  @Column(line(120)) name!: string;
  @Column(line(120)) company!: string;
  @Column(line(254)) email!: string;
  @Column(line(40)) phone!: string;
  @Column(document()) billingAddress!: Address;
  /** The city again, for lists. */
  @Column(line(80)) city!: string;
  @Column(flag()) taxExempt!: boolean;
  @Column(line(60)) exemptionCertificate!: string;
  @Column(notes()) notes!: string;
  @Column(optionalInstant()) archivedAt!: Date | null;
}
