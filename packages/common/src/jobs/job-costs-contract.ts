import * as z from 'zod';
import { costCategorySchema } from '../estimates/cost-categories.js';
import {
  centsSchema,
  dateSchema,
  idSchema,
  instantSchema,
  lineSchema,
  optionalLineSchema,
  paragraphSchema,
  positiveCentsSchema,
} from '../wire/fields.js';
import { rowsSchema } from '../wire/list.js';

/** What was spent on a job, besides the time that is clocked to it. */
export const createJobCostSchema = z.strictObject({
  category: costCategorySchema,
  description: lineSchema(200, 'The description'),
  amountCents: positiveCentsSchema,
  onDate: dateSchema,
  supplier: optionalLineSchema(120, 'The supplier'),
});
export type CreateJobCost = z.infer<typeof createJobCostSchema>;

/** A cost is never changed: a wrong one is reversed by a record with the opposite amount, then entered again. */
export const reverseJobCostSchema = z.strictObject({ reason: paragraphSchema(300, 'The reason') });
export type ReverseJobCost = z.infer<typeof reverseJobCostSchema>;

export const jobCostSchema = z.object({
  id: idSchema,
  category: costCategorySchema,
  description: z.string(),
  /** Below zero in a reversal. */
  amountCents: centsSchema,
  onDate: dateSchema,
  supplier: z.string(),
  reversesId: idSchema.nullable(),
  reversedById: idSchema.nullable(),
  /** Why it was reversed; empty on a cost. */
  reason: z.string(),
  recordedBy: z.string(),
  createdAt: instantSchema,
});
export type JobCost = z.infer<typeof jobCostSchema>;
export const jobCostsSchema = rowsSchema(jobCostSchema);
