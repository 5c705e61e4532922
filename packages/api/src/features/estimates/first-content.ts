import { addDays } from '@bookmatch/common/calendar/shop-dates';
import type { BillingStagePlan } from '@bookmatch/common/estimates/billing-schedule-contract';
import type { RevisionContent } from '@bookmatch/common/estimates/revision-contract';
import type { Customer } from '../customers/customers-public.js';
import { type Shop, todayAt } from '../shops/shops-public.js';

/** What a new estimate starts with: the shop's terms, days, tax and schedule, and no room yet. */
export function firstContent(
  shop: Shop,
  customer: Customer,
  newId: () => string,
  now: Date,
): RevisionContent {
  const schedule = shop.defaultBillingSchedule as BillingStagePlan[];
  return {
    ...taxFor(shop, customer),
    validUntil: validFrom(shop, now),
    intro: '',
    terms: shop.estimateTerms,
    exclusions: '',
    discountCents: 0,
    rooms: [],
    billingSchedule: schedule.map((stage) => ({ ...stage, id: newId() })),
  };
}

/** The shop's rule and rate, or none for a customer with an exemption certificate on file. */
export function taxFor(shop: Shop, customer: Customer): Pick<RevisionContent, 'taxRule' | 'taxRate'> {
  return { taxRule: customer.taxExempt ? 'exempt' : shop.taxRule, taxRate: shop.defaultTaxRate };
}

/** The last valid day of an estimate written today. */
export function validFrom(shop: Shop, now: Date): string {
  return addDays(todayAt(shop, now), shop.estimateValidDays);
}
