import { Column, Entity, ForeignKey, Index } from 'typeorm';
import { instant, optionalInstant, optionalLine, whole, word } from '../../platform/database/columns.js';
import { EditableRow } from '../../platform/database/rows.js';
import { Shop } from '../shops/shops-public.js';

/** The shop's own subscription to the product. One a shop. */
@Entity('subscription')
@Index('uq_subscription_shop', ['shopId'], { unique: true })
@Index('uq_subscription_provider', ['providerSubscriptionId'], { unique: true })
@ForeignKey(() => Shop, ['shopId'], ['id'], {
  name: 'fk_subscription_shop',
  onDelete: 'RESTRICT',
  onUpdate: 'NO ACTION',
})
export class Subscription extends EditableRow {
  @Column(word()) status!: string;
  @Column(instant()) trialEndsAt!: Date;
  @Column(optionalInstant()) currentPeriodEnd!: Date | null;
  /** Until when a shop that did not pay keeps working. */
  @Column(optionalInstant()) graceEndsAt!: Date | null;
  @Column(whole()) paidMembers!: number;
  @Column(optionalLine(60)) providerCustomerId!: string | null;
  @Column(optionalLine(60)) providerSubscriptionId!: string | null;
}
