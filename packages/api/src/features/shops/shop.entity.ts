import type { Address } from '@bookmatch/common/customers/customers-contract';
import type { BillingStagePlan } from '@bookmatch/common/estimates/billing-schedule-contract';
import { Column, Entity, Index } from 'typeorm';
import {
  document,
  instant,
  line,
  notes,
  optionalLine,
  rate,
  whole,
  word,
} from '../../platform/database/columns.js';
import { GlobalRow } from '../../platform/database/rows.js';

/** The tenant. */
@Entity('shop')
@Index('uq_shop_slug', ['slug'], { unique: true })
@Index('uq_shop_payment_account', ['paymentAccountId'], { unique: true })
export class Shop extends GlobalRow {
  @Column(whole()) version!: number;
  @Column(instant()) updatedAt!: Date;
  /** The shop's name in addresses; set once from its name. */
  @Column(line(60)) slug!: string;
  @Column(line(120)) name!: string;
  @Column(line(40)) phone!: string;
  @Column(line(254)) email!: string;
  @Column(document()) address!: Address;
  /** IANA time zone. */
  @Column(line(60)) timeZone!: string;
  @Column(word()) unitSystem!: 'inch' | 'metric';
  /** ISO 4217. */
  @Column(line(3)) currency!: string;
  @Column(word()) taxRule!: 'on-price' | 'shop-pays-use-tax';
  @Column(rate()) defaultTaxRate!: string;
  @Column(notes()) estimateTerms!: string;
  @Column(whole()) estimateValidDays!: number;
  @Column(whole()) invoiceDueDays!: number;
  @Column(document()) defaultBillingSchedule!: BillingStagePlan[];
  /** The shop's own account at the payment provider, where its customers' card payments settle. */
  @Column(optionalLine(60)) paymentAccountId!: string | null;
  @Column(word()) cardPayments!: 'not-set-up' | 'in-progress' | 'ready';
}
