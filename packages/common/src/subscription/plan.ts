/**
 * The one plan: what it costs and how long things last, for the rules, the pages and the demo. What a shop is shown and
 * charged is the payment provider's price, named by configuration; the figure here is for those who have no shop yet.
 */
export const PLAN = {
  name: 'Bookmatch',
  /** A month, for each active member. */
  pricePerMemberCents: 2_900,
  currency: 'USD',
  trialDays: 14,
  /** How long a shop keeps full access while a payment is past due. */
  graceDays: 7,
  /** From this many days before the end, the trial says so. */
  trialEndingDays: 4,
} as const;
