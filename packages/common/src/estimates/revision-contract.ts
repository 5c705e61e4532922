import * as z from 'zod';
import { MAX_PRICE_CENTS } from '../money/cents.js';
import {
  centsSchema,
  dateSchema,
  decimalSchema,
  idSchema,
  instantSchema,
  lineSchema,
  nonNegativeCentsSchema,
  notesSchema,
  rateSchema,
  versionSchema,
} from '../wire/fields.js';
import { billedStageSchema, billingScheduleSchema } from './billing-schedule-contract.js';
import { costCategorySchema } from './cost-categories.js';
import { taxRuleSchema } from './tax-rules.js';

export const REVISION_STATUSES = ['draft', 'sent', 'superseded', 'accepted', 'declined'] as const;
export const revisionStatusSchema = z.enum(REVISION_STATUSES);
export type RevisionStatus = z.infer<typeof revisionStatusSchema>;

export const QUANTITY_UNITS = ['each', 'ft', 'sq ft', 'bd ft', 'sheet', 'hour', 'set', 'lot'] as const;
export const quantityUnitSchema = z.enum(QUANTITY_UNITS, { error: 'Choose a unit.' });
export type QuantityUnit = z.infer<typeof quantityUnitSchema>;

/** Keeps a line's amount, and a revision's total, far inside safe integers. */
const unitCentsSchema = nonNegativeCentsSchema.max(100_000_000, 'Give at most $1,000,000 a unit.');

/** A line as typed. The client makes its id, which stays the same when the revision is saved again. */
export const estimateLineSchema = z.strictObject({
  id: idSchema,
  kind: costCategorySchema,
  description: lineSchema(300, 'The description'),
  quantity: decimalSchema(3, { max: 100_000 }),
  unit: quantityUnitSchema,
  unitCostCents: unitCentsSchema,
  unitPriceCents: unitCentsSchema,
  /** What time on this line is planned and clocked against; null when it takes no time of the crew. */
  operationId: idSchema.nullable(),
  /** Exact minutes for one unit of quantity; null when the line plans no time. */
  plannedMinutesPerUnit: decimalSchema(3, { max: 100_000 }).nullable(),
  taxable: z.boolean(),
});
export type EstimateLine = z.infer<typeof estimateLineSchema>;

export const MAX_PLANNED_MINUTES = 6_000_000;
export const MAX_ROOMS = 60;
export const MAX_LINES_PER_ROOM = 200;
export const estimateRoomSchema = z.strictObject({
  id: idSchema,
  name: lineSchema(120, "The room's name"),
  lines: z
    .array(estimateLineSchema)
    .max(MAX_LINES_PER_ROOM, `A room can have at most ${MAX_LINES_PER_ROOM} lines.`),
});
export type EstimateRoom = z.infer<typeof estimateRoomSchema>;

/** All of a revision that a person types; rules work on this. */
export const revisionContentSchema = z.strictObject({
  validUntil: dateSchema,
  taxRule: taxRuleSchema,
  taxRate: rateSchema,
  intro: notesSchema(),
  terms: notesSchema(8000),
  exclusions: notesSchema(),
  discountCents: nonNegativeCentsSchema,
  rooms: z.array(estimateRoomSchema).max(MAX_ROOMS, `An estimate can have at most ${MAX_ROOMS} rooms.`),
  billingSchedule: billingScheduleSchema,
});
export type RevisionContent = z.infer<typeof revisionContentSchema>;

/**
 * The whole document of a draft revision, put in place of what was there (PUT with If-Match of the revision's own
 * version), because the editor saves by itself while somebody types. What cannot be sent yet can still be saved: a
 * schedule that does not add up is kept, and named in `sendRefusals` of the answer.
 */
export const saveRevisionSchema = revisionContentSchema
  .refine(
    ({ rooms }) => allDistinct(rooms.flatMap((room) => [room.id, ...room.lines.map((line) => line.id)])),
    { error: 'Every room and line needs an id of its own.', path: ['rooms'] },
  )
  .refine(({ billingSchedule }) => allDistinct(billingSchedule.map((stage) => stage.id)), {
    error: 'Every stage needs an id of its own.',
    path: ['billingSchedule'],
  })
  .refine(({ rooms }) => upperBound(rooms, (line) => line.unitPriceCents) <= MAX_PRICE_CENTS, {
    error: 'The price of an estimate can be at most $40,000,000.',
    path: ['rooms'],
  })
  .refine(({ rooms }) => upperBound(rooms, (line) => line.unitCostCents) <= MAX_PRICE_CENTS, {
    error: 'The cost of an estimate can be at most $40,000,000.',
    path: ['rooms'],
  })
  .refine(
    ({ rooms }) => upperBound(rooms, (line) => Number(line.plannedMinutesPerUnit)) <= MAX_PLANNED_MINUTES,
    {
      error: 'An estimate can plan at most 100,000 hours.',
      path: ['rooms'],
    },
  );
export type SaveRevision = z.infer<typeof saveRevisionSchema>;
export type SaveRevisionInput = z.input<typeof saveRevisionSchema>;

/** Bounds that keep every sum of a revision, tax included, inside MAX_CENTS; no rounding is done here. */
function upperBound(rooms: EstimateRoom[], perUnit: (line: EstimateLine) => number): number {
  const lines = rooms.flatMap((room) => room.lines);
  return lines.reduce((sum, line) => sum + Number(line.quantity) * perUnit(line), 0);
}

function allDistinct(ids: string[]): boolean {
  return new Set(ids).size === ids.length;
}

export const plannedCategorySchema = z.object({ kind: costCategorySchema, costCents: centsSchema });
export type PlannedCategory = z.infer<typeof plannedCategorySchema>;

export const plannedOperationSchema = z.object({ operationId: idSchema, plannedMinutes: z.int() });
export type PlannedOperation = z.infer<typeof plannedOperationSchema>;

/** What the rules make of a revision's content. Net is the price without tax, total with it. */
export const estimateTotalsSchema = z.object({
  subtotalCents: centsSchema,
  discountCents: centsSchema,
  netCents: centsSchema,
  taxableCents: centsSchema,
  taxCents: centsSchema,
  totalCents: centsSchema,
  plannedCostCents: centsSchema,
  /** Every category with a cost, in the order of COST_CATEGORIES. */
  plannedCostByCategory: z.array(plannedCategorySchema),
  plannedMinutes: z.int(),
  plannedMinutesByOperation: z.array(plannedOperationSchema),
  /** Net less planned cost. */
  marginCents: centsSchema,
  /** Margin as a share of net, as a decimal to four places (`"0.4286"`); null when net is zero. */
  margin: z.string().nullable(),
  /** Margin as a share of cost; null when cost is zero. */
  markup: z.string().nullable(),
});
export type EstimateTotals = z.infer<typeof estimateTotalsSchema>;

export const revisionLineSchema = z.object({
  ...estimateLineSchema.shape,
  amountCents: centsSchema,
  costCents: centsSchema,
});
export type RevisionLine = z.infer<typeof revisionLineSchema>;

export const revisionRoomSchema = z.object({
  id: idSchema,
  name: z.string(),
  lines: z.array(revisionLineSchema),
  amountCents: centsSchema,
});
export type RevisionRoom = z.infer<typeof revisionRoomSchema>;

export const revisionSchema = z.object({
  id: idSchema,
  version: versionSchema,
  number: z.int(),
  status: revisionStatusSchema,
  validUntil: dateSchema,
  taxRule: taxRuleSchema,
  taxRate: z.string(),
  intro: z.string(),
  terms: z.string(),
  exclusions: z.string(),
  discountCents: centsSchema,
  rooms: z.array(revisionRoomSchema),
  /** Amounts are zero while the schedule does not add up. */
  billingSchedule: z.array(billedStageSchema),
  totals: estimateTotalsSchema,
  /** What must be put right before it can be sent; empty when nothing. */
  sendRefusals: z.array(z.string()),
  sentAt: instantSchema.nullable(),
  createdAt: instantSchema,
});
export type Revision = z.infer<typeof revisionSchema>;

export const revisionSummarySchema = z.object({
  id: idSchema,
  number: z.int(),
  status: revisionStatusSchema,
  totalCents: centsSchema,
  sentAt: instantSchema.nullable(),
  createdAt: instantSchema,
});
export type RevisionSummary = z.infer<typeof revisionSummarySchema>;
