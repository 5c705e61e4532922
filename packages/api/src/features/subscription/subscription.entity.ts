import type { SubscriptionStatus } from '@bookmatch/common/subscription/subscription-contract';
import { Column, Entity, ForeignKey, Index } from 'typeorm';
import {
  flag,
  instant,
  optionalInstant,
  optionalLine,
  optionalWord,
  whole,
  word,
} from '../../platform/database/columns.js';
import { EditableRow } from '../../platform/database/rows.js';
import { Shop } from '../shops/shops-public.js';

/** The shop's own subscription to the product. One a shop. */
@Entity('subscription')
@Index('uq_subscription_shop', ['shopId'], { unique: true })
@Index('uq_subscription_customer', ['providerCustomerId'], { unique: true })
@Index('uq_subscription_provider', ['providerSubscriptionId'], { unique: true })
@ForeignKey(() => Shop, ['shopId'], ['id'], {
  name: 'fk_subscription_shop',
  onDelete: 'RESTRICT',
  onUpdate: 'NO ACTION',
})
export class Subscription extends EditableRow {
  @Column(word()) status!: SubscriptionStatus;
  @Column(instant()) trialEndsAt!: Date;
  @Column(optionalInstant()) currentPeriodEnd!: Date | null;
  /** Until when a shop that did not pay keeps working. */
  @Column(optionalInstant()) graceEndsAt!: Date | null;
  @Column(flag()) cancelAtPeriodEnd!: boolean;
  @Column(whole()) paidMembers!: number;
  @Column(optionalLine(60)) providerCustomerId!: string | null;
  @Column(optionalLine(60)) providerSubscriptionId!: string | null;
  /** The one payment page that is open; starting over ends it. */
  @Column(optionalLine(100)) checkoutSessionId!: string | null;
  /** The provider's invoice that owners were last written about, so that each is mourned once. */
  @Column(optionalLine(60)) failedInvoiceId!: string | null;
  /** The last letter about the trial: `ending`, then `ended`. */
  @Column(optionalWord()) trialLetter!: 'ending' | 'ended' | null;
}
