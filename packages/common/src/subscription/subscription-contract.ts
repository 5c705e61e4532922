import * as z from 'zod';
import { instantSchema, nonNegativeCentsSchema } from '../wire/fields.js';

/**
 * Where a shop's own subscription is. All but one are the payment provider's words; `trial-ended` is ours, for a trial
 * that ran out before anybody subscribed (the provider has no object for it).
 */
export const SUBSCRIPTION_STATUSES = [
  'trialing',
  'trial-ended',
  'active',
  'past_due',
  'unpaid',
  'paused',
  'canceled',
] as const;
export const subscriptionStatusSchema = z.enum(SUBSCRIPTION_STATUSES);
export type SubscriptionStatus = z.infer<typeof subscriptionStatusSchema>;

/** Read-only keeps everything readable and exportable; nothing can be changed but the subscription itself. */
export const SUBSCRIPTION_ACCESS = ['full', 'read-only'] as const;
export const subscriptionAccessSchema = z.enum(SUBSCRIPTION_ACCESS);
export type SubscriptionAccess = z.infer<typeof subscriptionAccessSchema>;

export const SUBSCRIPTION_BANNERS = ['none', 'trial-ending', 'past-due-grace', 'read-only'] as const;
export const subscriptionBannerSchema = z.enum(SUBSCRIPTION_BANNERS);
export type SubscriptionBanner = z.infer<typeof subscriptionBannerSchema>;

export const subscriptionStandingSchema = z.object({
  access: subscriptionAccessSchema,
  banner: subscriptionBannerSchema,
  /** Whole days until the trial or the grace period ends, the day in progress counted; null when nothing runs out. */
  daysLeft: z.int().nullable(),
});
export type SubscriptionStanding = z.infer<typeof subscriptionStandingSchema>;

export const subscriptionSchema = z.object({
  status: subscriptionStatusSchema,
  standing: subscriptionStandingSchema,
  trialEndsAt: instantSchema,
  currentPeriodEnd: instantSchema.nullable(),
  graceEndsAt: instantSchema.nullable(),
  cancelAtPeriodEnd: z.boolean(),
  /** The active members that are paid for. */
  members: z.int(),
  pricePerMemberCents: nonNegativeCentsSchema,
  monthlyTotalCents: nonNegativeCentsSchema,
});
export type Subscription = z.infer<typeof subscriptionSchema>;

// Starting a checkout and opening the portal take an empty body and answer with `redirectSchema`: the plan, the price
// and the number of members come from the server.
