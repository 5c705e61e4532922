import * as z from 'zod';
import { addressSchema } from '../customers/customers-contract.js';
import {
  billingDueSchema,
  billingShareSchema,
  defaultBillingScheduleSchema,
} from '../estimates/billing-schedule-contract.js';
import { costCategorySchema, timeCategorySchema } from '../estimates/cost-categories.js';
import { invoiceStandingSchema } from '../invoices/invoice-standings.js';
import {
  centsSchema,
  dateSchema,
  idSchema,
  instantSchema,
  lineSchema,
  nonNegativeCentsSchema,
  notesSchema,
  optionalLineSchema,
  versionSchema,
} from '../wire/fields.js';
import { listQuerySchema, pageSchema } from '../wire/list.js';
import { patchSchema } from '../wire/patch.js';

export const JOB_STAGES = [
  'accepted',
  'measured',
  'drawings-approved',
  'materials-in',
  'building',
  'finishing',
  'installing',
  'closed',
] as const;
export const jobStageSchema = z.enum(JOB_STAGES, { error: 'Choose a stage.' });
export type JobStage = z.infer<typeof jobStageSchema>;

/** A job begins with the acceptance of an estimate, or by hand; these are its own fields. */
export const jobFieldsSchema = z.strictObject({
  title: lineSchema(120, 'The title'),
  installOn: dateSchema.nullable().default(null),
  /** Whether every member of the crew sees the job, or only those assigned to it. */
  openToCrew: z.boolean().default(true),
  notes: notesSchema(),
});
export const updateJobSchema = patchSchema(jobFieldsSchema);
export type UpdateJob = z.infer<typeof updateJobSchema>;

const MAX_PLANNED_MINUTES = 600_000;
/** A job taken on without an estimate: repeat work, whose price and plan are known. */
export const createJobSchema = jobFieldsSchema.extend({
  customerId: idSchema,
  siteId: idSchema.nullable().default(null),
  /** The agreed price without tax, and its tax; both zero for work that is not billed. */
  contractNetCents: nonNegativeCentsSchema.default(0),
  contractTaxCents: nonNegativeCentsSchema.default(0),
  /** Planned time by operation. It is planned to cost the operation's own rate, in its own category. */
  operations: z
    .array(
      z.strictObject({
        operationId: idSchema,
        plannedMinutes: z.int('Give whole minutes.').min(1).max(MAX_PLANNED_MINUTES, 'This is too long.'),
      }),
    )
    .max(100, 'A job can plan at most 100 operations.')
    .refine((rows) => allDistinct(rows.map((row) => row.operationId)), 'Plan each operation once.')
    .default([]),
  /** Planned cost by category, besides that time. */
  plannedCosts: z
    .array(z.strictObject({ category: costCategorySchema, plannedCents: nonNegativeCentsSchema }))
    .refine((rows) => allDistinct(rows.map((row) => row.category)), 'Plan each category once.')
    .default([]),
  /** The shop's own schedule when left out. */
  billingSchedule: defaultBillingScheduleSchema.optional(),
});
export type CreateJob = z.infer<typeof createJobSchema>;
export type CreateJobInput = z.input<typeof createJobSchema>;

function allDistinct(values: readonly string[]): boolean {
  return new Set(values).size === values.length;
}

// Commands. Each carries If-Match.

export const moveJobSchema = z.strictObject({
  stage: jobStageSchema,
  /** Said by the person when stages are skipped; without it a skip is refused with the stages named. */
  confirmSkip: z.boolean().default(false),
  /** Why a job is closed although a billing stage is not billed; without it that is refused. */
  reason: optionalLineSchema(300, 'The reason'),
});
export type MoveJob = z.infer<typeof moveJobSchema>;

/** The whole list of members assigned to the job. */
export const assignJobSchema = z.strictObject({
  memberIds: z.array(idSchema).max(50, 'A job can have at most 50 members.'),
});
export type AssignJob = z.infer<typeof assignJobSchema>;

/** One operation of the job, planned and built; time clocked to an operation that was not planned has a row too. */
export const jobOperationSchema = z.object({
  operationId: idSchema,
  name: z.string(),
  /** The row of the job's costs that its time falls in. */
  category: timeCategorySchema,
  plannedMinutes: z.int(),
  clockedMinutes: z.int(),
  /** The part of it that falls in the shop's current workweek. */
  thisWeekMinutes: z.int(),
  // money
  plannedCostCents: centsSchema.optional(),
  actualCostCents: centsSchema.optional(),
});
export type JobOperation = z.infer<typeof jobOperationSchema>;

/** One category of cost, planned and built. */
export const jobCostRowSchema = z.object({
  category: costCategorySchema,
  plannedCents: centsSchema,
  actualCents: centsSchema,
});
export type JobCostRow = z.infer<typeof jobCostRowSchema>;

/** One stage of the accepted billing schedule, as agreed and as billed. All amounts with tax. */
export const jobBillingRowSchema = z.object({
  billingStageId: idSchema,
  name: z.string(),
  share: billingShareSchema,
  deposit: z.boolean(),
  due: billingDueSchema,
  plannedCents: centsSchema,
  billedCents: centsSchema,
  paidCents: centsSchema,
  /** One step on: the stage's invoice, draft or issued. */
  invoice: z
    .object({
      id: idSchema,
      number: z.int().nullable(),
      standing: invoiceStandingSchema,
      daysOverdue: z.int(),
    })
    .nullable(),
});
export type JobBillingRow = z.infer<typeof jobBillingRowSchema>;

/** All of a job's money in one place: who may not see it gets no such key. */
export const jobMoneySchema = z.object({
  /** The accepted price without tax, its tax, and both. */
  contractNetCents: centsSchema,
  contractTaxCents: centsSchema,
  contractTotalCents: centsSchema,
  plannedCostCents: centsSchema,
  actualCostCents: centsSchema,
  /** Spent and still to go, category by category: what the job is on pace for. */
  expectedCostCents: centsSchema,
  costs: z.array(jobCostRowSchema),
  billing: z.array(jobBillingRowSchema),
  /** Invoiced with tax, less credits; and what was paid of it. */
  billedCents: centsSchema,
  billedNetCents: centsSchema,
  paidCents: centsSchema,
  /** Cost-to-cost, as a decimal to four places, never above 1; null when no cost was planned. */
  percentComplete: z.string().nullable(),
  /** The share of the net contract that the work done has earned. */
  earnedCents: centsSchema,
  /** Net billed less earned: above zero over-billed, below zero under-billed. */
  overBilledCents: centsSchema,
});
export type JobMoney = z.infer<typeof jobMoneySchema>;

/** One step of the job from stage to stage. */
export const stageChangeSchema = z.object({
  stage: jobStageSchema,
  at: instantSchema,
  /** Null when the customer's acceptance began the job. */
  by: z.string().nullable(),
  reason: z.string(),
});
export type StageChange = z.infer<typeof stageChangeSchema>;

export const jobSchema = z.object({
  id: idSchema,
  version: versionSchema,
  number: z.int(),
  title: z.string(),
  customer: z.object({ id: idSchema, name: z.string() }),
  site: z.object({ id: idSchema, name: z.string(), address: addressSchema, notes: z.string() }).nullable(),
  /** One step back. Its price is not here, only the way to it for who may read it. Null for repeat work. */
  estimate: z.object({ id: idSchema, number: z.int(), revisionNumber: z.int() }).nullable(),
  stage: jobStageSchema,
  stageChangedAt: instantSchema,
  /** Oldest first. */
  stageHistory: z.array(stageChangeSchema),
  installOn: dateSchema.nullable(),
  openToCrew: z.boolean(),
  assignedMembers: z.array(z.object({ memberId: idSchema, name: z.string() })),
  notes: z.string(),
  operations: z.array(jobOperationSchema),
  plannedMinutes: z.int(),
  clockedMinutes: z.int(),
  closedAt: instantSchema.nullable(),
  createdAt: instantSchema,
  // money
  money: jobMoneySchema.optional(),
});
export type Job = z.infer<typeof jobSchema>;

export const jobRowSchema = z.object({
  id: idSchema,
  version: versionSchema,
  number: z.int(),
  title: z.string(),
  customerName: z.string(),
  siteCity: z.string(),
  stage: jobStageSchema,
  installOn: dateSchema.nullable(),
  assignedMemberIds: z.array(idSchema),
  plannedMinutes: z.int(),
  clockedMinutes: z.int(),
  createdAt: instantSchema,
  // money
  contractTotalCents: centsSchema.optional(),
  plannedCostCents: centsSchema.optional(),
  actualCostCents: centsSchema.optional(),
});
export type JobRow = z.infer<typeof jobRowSchema>;
export const jobPageSchema = pageSchema(jobRowSchema);

export const JOB_SORT_KEYS = ['number', 'title', 'installOn', 'createdAt'] as const;
export const jobListQuerySchema = listQuerySchema(JOB_SORT_KEYS).extend({
  /** One stage, or `open` for all that are not closed. */
  stage: z.enum([...JOB_STAGES, 'open']).optional(),
  /** `me`, or a member's id. */
  assigned: z.union([z.literal('me'), idSchema]).optional(),
  customerId: idSchema.optional(),
  /** Days of the install date, both included. */
  installFrom: dateSchema.optional(),
  installTo: dateSchema.optional(),
});
export type JobListQuery = z.infer<typeof jobListQuerySchema>;

/** The whole list as CSV: the list's filters and order, without pages. */
export const jobExportQuerySchema = jobListQuerySchema.omit({ after: true, limit: true });
export type JobExportQuery = z.infer<typeof jobExportQuerySchema>;
