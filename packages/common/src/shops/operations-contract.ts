import * as z from 'zod';
import { timeCategorySchema } from '../estimates/cost-categories.js';
import { idSchema, lineSchema, nonNegativeCentsSchema, versionSchema } from '../wire/fields.js';
import { rowsSchema } from '../wire/list.js';
import { patchSchema } from '../wire/patch.js';

/** What an hour of the operation is planned to cost; fills in the unit cost of a labor line. */
const defaultRateSchema = nonNegativeCentsSchema
  .max(100_000, 'An hour cannot cost more than $1,000.')
  .nullable();

export const operationFieldsSchema = z.strictObject({
  name: lineSchema(80, 'The name'),
  /** The row of the job's costs that time clocked to this operation falls in. */
  costCategory: timeCategorySchema.default('labor'),
  /** False for time that belongs to no job: clean-up, machine upkeep, meetings. */
  onJob: z.boolean().default(true),
  defaultRateCentsPerHour: defaultRateSchema.default(null),
});
export const createOperationSchema = operationFieldsSchema;
export type CreateOperation = z.infer<typeof createOperationSchema>;

export const updateOperationSchema = patchSchema(operationFieldsSchema.omit({ onJob: true })).extend({
  /** An archived operation takes no new time and stays on what it was used for. */
  archived: z.boolean().optional(),
});
export type UpdateOperation = z.infer<typeof updateOperationSchema>;

/** All operations of the shop in their new order, archived ones included. */
export const reorderOperationsSchema = z.strictObject({
  operationIds: z
    .array(idSchema)
    .min(1)
    .max(100)
    .refine((ids) => new Set(ids).size === ids.length, 'Each operation can stand in the order only once.'),
});
export type ReorderOperations = z.infer<typeof reorderOperationsSchema>;

export const operationSchema = z.object({
  id: idSchema,
  version: versionSchema,
  name: z.string(),
  position: z.int(),
  costCategory: timeCategorySchema,
  onJob: z.boolean(),
  archived: z.boolean(),
  // money
  defaultRateCentsPerHour: defaultRateSchema.optional(),
});
export type Operation = z.infer<typeof operationSchema>;
export const operationsSchema = rowsSchema(operationSchema);
