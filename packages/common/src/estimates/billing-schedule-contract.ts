import * as z from 'zod';
import { centsSchema, decimalSchema, idSchema, lineSchema, positiveCentsSchema } from '../wire/fields.js';

/** When a stage's invoice is drafted: at once when the estimate is accepted, or when somebody bills it. */
export const BILLING_DUES = ['on-acceptance', 'by-hand'] as const;
export const billingDueSchema = z.enum(BILLING_DUES);
export type BillingDue = z.infer<typeof billingDueSchema>;

/** What part of the price a stage bills: a percent (`"40"` is 40 %), an amount with its tax, or all that is left. */
export const billingShareSchema = z.union(
  [
    z.strictObject({ percent: decimalSchema(3, { min: 0, max: 100 }) }),
    z.strictObject({ amountCents: positiveCentsSchema }),
    z.strictObject({ remainder: z.literal(true) }),
  ],
  { error: 'Give a percent, an amount, or the remainder.' },
);
export type BillingShare = z.infer<typeof billingShareSchema>;

/** A stage without identity, as a shop's default schedule keeps it. */
export const billingStagePlanSchema = z.strictObject({
  name: lineSchema(80, "The stage's name"),
  share: billingShareSchema,
  /** A deposit is owed to the customer until work earns it. */
  deposit: z.boolean(),
  due: billingDueSchema,
});
export type BillingStagePlan = z.infer<typeof billingStagePlanSchema>;

export const MAX_BILLING_STAGES = 12;
export const defaultBillingScheduleSchema = z
  .array(billingStagePlanSchema)
  .min(1, 'A billing schedule needs a stage.')
  .max(MAX_BILLING_STAGES, `A billing schedule can have at most ${MAX_BILLING_STAGES} stages.`);

/** A stage of a revision; the client makes its id, which stays the same when the revision is saved again. */
export const billingStageSchema = billingStagePlanSchema.extend({ id: idSchema });
export type BillingStage = z.infer<typeof billingStageSchema>;

export const billingScheduleSchema = z
  .array(billingStageSchema)
  .min(1, 'A billing schedule needs a stage.')
  .max(MAX_BILLING_STAGES, `A billing schedule can have at most ${MAX_BILLING_STAGES} stages.`);

/** A stage with what it comes to; the stages of a schedule add up to the revision's totals to the cent. */
export const billedStageSchema = z.object({
  ...billingStageSchema.shape,
  netCents: centsSchema,
  taxCents: centsSchema,
  totalCents: centsSchema,
});
export type BilledStage = z.infer<typeof billedStageSchema>;
