import * as z from 'zod';
import { questionSchema } from '../customer-page/questions-contract.js';
import {
  centsSchema,
  dateSchema,
  emailSchema,
  idSchema,
  instantSchema,
  lineSchema,
  notesSchema,
  versionSchema,
} from '../wire/fields.js';
import { listQuerySchema, pageSchema } from '../wire/list.js';
import { revisionSchema, revisionSummarySchema } from './revision-contract.js';

/**
 * `expired` is never stored: it is a sent estimate whose date has passed, and a new date makes it `sent` again.
 * See `estimateStatus` in revision-stages.ts.
 */
export const ESTIMATE_STATUSES = ['draft', 'sent', 'accepted', 'declined', 'expired'] as const;
export const estimateStatusSchema = z.enum(ESTIMATE_STATUSES);
export type EstimateStatus = z.infer<typeof estimateStatusSchema>;

/** A new estimate starts with one draft revision that takes terms, days, tax and schedule from the shop. */
export const createEstimateSchema = z.strictObject({
  title: lineSchema(120, 'The title'),
  customerId: idSchema,
  siteId: idSchema.nullable().default(null),
  leadId: idSchema.nullable().default(null),
});
export type CreateEstimate = z.infer<typeof createEstimateSchema>;

/** The estimate's own fields, not its revision's. The customer stays: for another customer, duplicate it. */
export const updateEstimateSchema = z.strictObject({
  title: lineSchema(120, 'The title').optional(),
  siteId: idSchema.nullable().optional(),
});
export type UpdateEstimate = z.infer<typeof updateEstimateSchema>;

// Commands. All but duplicate carry If-Match of the estimate.

/** A copy of the current revision as a new draft. The sent one stands until the new one is sent. */
export const createRevisionSchema = z.strictObject({});

export const sendEstimateSchema = z.strictObject({
  to: emailSchema,
  message: notesSchema(2000),
  /** The version of the current revision: the editor saves by itself, and what is sent is what was seen. */
  revisionVersion: versionSchema,
});
export type SendEstimate = z.infer<typeof sendEstimateSchema>;

/** The shop records that the customer said no. */
export const declineEstimateSchema = z.strictObject({ reason: notesSchema(1000) });
export type DeclineEstimate = z.infer<typeof declineEstimateSchema>;

/** A new estimate with the current revision's rooms and lines, for the same customer unless another is named. */
export const duplicateEstimateSchema = z.strictObject({
  title: lineSchema(120, 'The title').optional(),
  customerId: idSchema.optional(),
  siteId: idSchema.nullable().optional(),
});
export type DuplicateEstimate = z.infer<typeof duplicateEstimateSchema>;

export const estimateSendSchema = z.object({
  id: idSchema,
  to: z.string(),
  revisionNumber: z.int(),
  sentAt: instantSchema,
});
export type EstimateSend = z.infer<typeof estimateSendSchema>;

/** Who accepted what, and the proof of it. */
export const acceptanceSchema = z.object({
  revisionId: idSchema,
  revisionNumber: z.int(),
  /** The name as the customer typed it. */
  name: z.string(),
  acceptedAt: instantSchema,
  /** The network address it came from. */
  address: z.string(),
  /** SHA-256, hex, of the canonical text in accepted-document.ts. */
  documentHash: z.string(),
});
export type Acceptance = z.infer<typeof acceptanceSchema>;

export const estimateSchema = z.object({
  id: idSchema,
  version: versionSchema,
  number: z.int(),
  title: z.string(),
  status: estimateStatusSchema,
  customer: z.object({ id: idSchema, name: z.string(), email: z.string(), taxExempt: z.boolean() }),
  site: z.object({ id: idSchema, name: z.string() }).nullable(),
  /** One step back and one step on. */
  lead: z.object({ id: idSchema, title: z.string() }).nullable(),
  job: z.object({ id: idSchema, number: z.int() }).nullable(),
  /** The accepted revision, or else the newest. */
  currentRevision: revisionSchema,
  revisions: z.array(revisionSummarySchema),
  sends: z.array(estimateSendSchema),
  questions: z.array(questionSchema),
  acceptance: acceptanceSchema.nullable(),
  declineReason: z.string(),
  createdAt: instantSchema,
});
export type Estimate = z.infer<typeof estimateSchema>;

export const estimateRowSchema = z.object({
  id: idSchema,
  number: z.int(),
  title: z.string(),
  customerId: idSchema,
  customerName: z.string(),
  status: estimateStatusSchema,
  revisionNumber: z.int(),
  validUntil: dateSchema,
  openQuestions: z.int(),
  sentAt: instantSchema.nullable(),
  createdAt: instantSchema,
  totalCents: centsSchema,
});
export type EstimateRow = z.infer<typeof estimateRowSchema>;
export const estimatePageSchema = pageSchema(estimateRowSchema);

export const ESTIMATE_SORT_KEYS = ['number', 'title', 'createdAt'] as const;
export const estimateListQuerySchema = listQuerySchema(ESTIMATE_SORT_KEYS).extend({
  status: estimateStatusSchema.optional(),
  customerId: idSchema.optional(),
  leadId: idSchema.optional(),
});
export type EstimateListQuery = z.infer<typeof estimateListQuerySchema>;

/** The whole list as a file, with the list's own filters and order. */
export const estimateExportQuerySchema = estimateListQuerySchema.omit({ after: true, limit: true });
export type EstimateExportQuery = z.infer<typeof estimateExportQuerySchema>;
