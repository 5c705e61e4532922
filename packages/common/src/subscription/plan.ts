/** The one plan: what it costs and how long things last. Read by the rules, the pages and the demo alike. */
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
