import type { Address } from '@bookmatch/common/customers/customers-contract';
import { Column, Entity, ForeignKey, Index } from 'typeorm';
import { document, id, line, notes } from '../../platform/database/columns.js';
import { EditableRow } from '../../platform/database/rows.js';
import { Customer } from './customer.entity.js';

/** Where the work goes. */
@Entity('site')
@Index('ix_site_customer', ['shopId', 'customerId'])
@ForeignKey(() => Customer, ['shopId', 'customerId'], ['shopId', 'id'], {
  name: 'fk_site_customer',
  onDelete: 'RESTRICT',
  onUpdate: 'NO ACTION',
})
export class Site extends EditableRow {
  @Column(id()) customerId!: string;
  @Column(line(120)) name!: string;
  @Column(document()) address!: Address;
  @Column(notes()) notes!: string;
}
