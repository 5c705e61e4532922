import { Column, Entity, ForeignKey, Index } from 'typeorm';
import { id, instant, optionalId, optionalInstant } from '../../platform/database/columns.js';
import { ShopRow } from '../../platform/database/rows.js';
import { Customer } from '../customers/customers-public.js';
import { Estimate } from '../estimates/estimates-public.js';
import { Invoice } from '../invoices/invoices-public.js';

/** A customer's way in, to one estimate or one invoice. Its secret is not kept: it is signed anew from the id. */
@Entity('customer_link')
@Index('ix_customer_link_customer', ['shopId', 'customerId'])
@Index('ix_customer_link_estimate', ['shopId', 'estimateId', 'createdAt'])
@Index('ix_customer_link_invoice', ['shopId', 'invoiceId', 'createdAt'])
@Index('ix_customer_link_id', ['id'])
@ForeignKey(() => Customer, ['shopId', 'customerId'], ['shopId', 'id'], {
  name: 'fk_customer_link_customer',
  onDelete: 'RESTRICT',
  onUpdate: 'NO ACTION',
})
@ForeignKey(() => Estimate, ['shopId', 'estimateId'], ['shopId', 'id'], {
  name: 'fk_customer_link_estimate',
  onDelete: 'RESTRICT',
  onUpdate: 'NO ACTION',
})
@ForeignKey(() => Invoice, ['shopId', 'invoiceId'], ['shopId', 'id'], {
  name: 'fk_customer_link_invoice',
  onDelete: 'RESTRICT',
  onUpdate: 'NO ACTION',
})
export class CustomerLink extends ShopRow {
  @Column(id()) customerId!: string;
  /** One of the two is set. */
  @Column(optionalId()) estimateId!: string | null;
  @Column(optionalId()) invoiceId!: string | null;
  @Column(instant()) expiresAt!: Date;
  @Column(optionalInstant()) revokedAt!: Date | null;
  @Column(optionalInstant()) lastSeenAt!: Date | null;
}
