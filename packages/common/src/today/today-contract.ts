import * as z from 'zod';
import { estimateRowSchema } from '../estimates/estimates-contract.js';
import { agingBucketsSchema } from '../invoices/aging-contract.js';
import { invoiceRowSchema, paymentRowSchema } from '../invoices/invoices-contract.js';
import { jobStageSchema } from '../jobs/jobs-contract.js';
import { leadRowSchema, openLeadStageSchema } from '../leads/leads-contract.js';
import { clockStateSchema } from '../time/clock-contract.js';
import { centsSchema, dateSchema, idSchema, instantSchema } from '../wire/fields.js';

/** A list on a first page shows this many rows and counts the rest. */
export const TODAY_LIMIT = 8;

function shortListSchema<Row extends z.ZodType>(row: Row) {
  return z.object({ count: z.int(), rows: z.array(row).max(TODAY_LIMIT) });
}

/** Somebody who is clocked in at this moment. */
export const onTheClockSchema = z.object({
  memberId: idSchema,
  memberName: z.string(),
  kind: z.enum(['work', 'meal-break']),
  jobId: idSchema.nullable(),
  jobNumber: z.int().nullable(),
  jobTitle: z.string().nullable(),
  operationName: z.string().nullable(),
  startedAt: instantSchema,
});
export type OnTheClock = z.infer<typeof onTheClockSchema>;

/** A job as the floor needs it: no money. */
export const jobInHandSchema = z.object({
  id: idSchema,
  number: z.int(),
  title: z.string(),
  customerName: z.string(),
  stage: jobStageSchema,
  installOn: dateSchema.nullable(),
  plannedMinutes: z.int(),
  clockedMinutes: z.int(),
});
export type JobInHand = z.infer<typeof jobInHandSchema>;

export const ownerTodaySchema = z.object({
  role: z.literal('owner'),
  on: dateSchema,
  /** Open leads whose next step is today or overdue, the oldest first. */
  leadsToFollowUp: shortListSchema(leadRowSchema),
  /** Every open stage, in order. */
  leadsByStage: z.array(z.object({ stage: openLeadStageSchema, count: z.int() })),
  /** Sent and not answered, the oldest first; questions without an answer count before everything. */
  estimatesWaiting: shortListSchema(estimateRowSchema),
  /** Every stage but closed, in order. */
  jobsByStage: z.array(z.object({ stage: jobStageSchema, count: z.int() })),
  /** Not closed, the soonest install first. */
  jobsInHand: shortListSchema(jobInHandSchema),
  overdueInvoices: shortListSchema(invoiceRowSchema),
  overdueCents: centsSchema,
  aging: agingBucketsSchema,
  /** What is due in the coming 30 days of invoices issued, and what is late already. */
  cashExpectedCents: centsSchema,
  onTheClock: z.array(onTheClockSchema),
  /** Work of everybody this workweek, closed entries. */
  weekMinutes: z.int(),
});
export type OwnerToday = z.infer<typeof ownerTodaySchema>;

export const bookkeeperTodaySchema = z.object({
  role: z.literal('bookkeeper'),
  on: dateSchema,
  draftsToIssue: shortListSchema(invoiceRowSchema),
  overdueInvoices: shortListSchema(invoiceRowSchema),
  overdueCents: centsSchema,
  paymentsThisWeek: shortListSchema(paymentRowSchema),
  paidThisWeekCents: centsSchema,
  aging: agingBucketsSchema,
});
export type BookkeeperToday = z.infer<typeof bookkeeperTodaySchema>;

export const leadHandTodaySchema = z.object({
  role: z.literal('lead-hand'),
  on: dateSchema,
  /** Not closed, the soonest install first. */
  jobsInHand: shortListSchema(jobInHandSchema),
  onTheClock: z.array(onTheClockSchema),
  installsThisWeek: z.array(jobInHandSchema),
  clock: clockStateSchema,
});
export type LeadHandToday = z.infer<typeof leadHandTodaySchema>;

export const crewTodaySchema = z.object({
  role: z.literal('crew'),
  on: dateSchema,
  clock: clockStateSchema,
});
export type CrewToday = z.infer<typeof crewTodaySchema>;

/** The first page of the one who asks. */
export const todaySchema = z.discriminatedUnion('role', [
  ownerTodaySchema,
  bookkeeperTodaySchema,
  leadHandTodaySchema,
  crewTodaySchema,
]);
export type Today = z.infer<typeof todaySchema>;
