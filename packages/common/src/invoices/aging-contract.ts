import * as z from 'zod';
import { centsSchema, dateSchema, idSchema } from '../wire/fields.js';

/** What is owed, by how many days it is past its due date. `current` is not yet due, the due date included. */
export const agingBucketsSchema = z.object({
  currentCents: centsSchema,
  days1To30Cents: centsSchema,
  days31To60Cents: centsSchema,
  days61To90Cents: centsSchema,
  over90Cents: centsSchema,
  totalCents: centsSchema,
});
export type AgingBuckets = z.infer<typeof agingBucketsSchema>;

/** One customer who owes something; who owes nothing has no row. */
export const agingRowSchema = agingBucketsSchema.extend({ customerId: idSchema, customerName: z.string() });
export type AgingRow = z.infer<typeof agingRowSchema>;

export const agingQuerySchema = z.strictObject({
  /** The day to count from: today in the shop's zone when left out. */
  on: dateSchema.optional(),
});
export type AgingQuery = z.infer<typeof agingQuerySchema>;

export const agingSchema = z.object({
  on: dateSchema,
  rows: z.array(agingRowSchema),
  totals: agingBucketsSchema,
});
export type Aging = z.infer<typeof agingSchema>;
