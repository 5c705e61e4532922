import * as z from 'zod';
import { shopNameSchema } from '../accounts/accounts-contract.js';
import { timeZoneSchema } from '../calendar/time-zone.js';
import { addressSchema } from '../customers/customers-contract.js';
import { defaultBillingScheduleSchema } from '../estimates/billing-schedule-contract.js';
import { shopTaxRuleSchema } from '../estimates/tax-rules.js';
import { unitSystemSchema } from '../measure/unit-system.js';
import {
  currencySchema,
  emailSchema,
  idSchema,
  notesSchema,
  optionalLineSchema,
  rateSchema,
  versionSchema,
} from '../wire/fields.js';
import { patchSchema } from '../wire/patch.js';

/** Whether customers can pay the shop by card, through its own account at the payment provider. */
export const CARD_PAYMENT_STATUSES = ['not-set-up', 'in-progress', 'ready'] as const;
export const cardPaymentStatusSchema = z.enum(CARD_PAYMENT_STATUSES);
export type CardPaymentStatus = z.infer<typeof cardPaymentStatusSchema>;

const daysSchema = (max: number) =>
  z.int('Give whole days.').min(0, 'Days cannot be below zero.').max(max, `Give at most ${max} days.`);

export const shopFieldsSchema = z.strictObject({
  name: shopNameSchema,
  phone: optionalLineSchema(40, 'The phone number'),
  email: z.union([z.literal(''), emailSchema]).default(''),
  address: addressSchema.prefault({}),
  timeZone: timeZoneSchema,
  unitSystem: unitSystemSchema,
  /** State and local together. */
  defaultTaxRate: rateSchema,
  taxRule: shopTaxRuleSchema,
  /** What every new estimate says at its end. */
  estimateTerms: notesSchema(),
  estimateValidDays: daysSchema(365),
  invoiceDueDays: daysSchema(180),
  defaultBillingSchedule: defaultBillingScheduleSchema,
});
export const updateShopSchema = patchSchema(shopFieldsSchema);
export type UpdateShop = z.infer<typeof updateShopSchema>;

export const shopSchema = z.object({
  id: idSchema,
  version: versionSchema,
  slug: z.string(),
  name: z.string(),
  phone: z.string(),
  email: z.string(),
  address: addressSchema,
  timeZone: z.string(),
  unitSystem: unitSystemSchema,
  currency: currencySchema,
  defaultTaxRate: z.string(),
  taxRule: shopTaxRuleSchema,
  estimateTerms: z.string(),
  estimateValidDays: z.int(),
  invoiceDueDays: z.int(),
  defaultBillingSchedule: defaultBillingScheduleSchema,
  cardPayments: cardPaymentStatusSchema,
});
export type Shop = z.infer<typeof shopSchema>;

/** One more shop for somebody who is signed in already. */
export const createShopSchema = z.strictObject({
  shopName: shopNameSchema,
  timeZone: timeZoneSchema,
  unitSystem: unitSystemSchema,
});
export type CreateShop = z.infer<typeof createShopSchema>;
