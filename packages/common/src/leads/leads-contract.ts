import * as z from 'zod';
import { addressSchema, createCustomerSchema, siteFieldsSchema } from '../customers/customers-contract.js';
import {
  centsSchema,
  dateSchema,
  emailSchema,
  idSchema,
  instantSchema,
  lineSchema,
  nonNegativeCentsSchema,
  notesSchema,
  optionalLineSchema,
  paragraphSchema,
  versionSchema,
} from '../wire/fields.js';
import { listQuerySchema, pageSchema, rowsSchema } from '../wire/list.js';
import { patchSchema } from '../wire/patch.js';

export const LEAD_SOURCES = [
  'referral',
  'repeat-customer',
  'website',
  'walk-in',
  'contractor',
  'designer',
  'show-or-fair',
  'other',
] as const;
export const leadSourceSchema = z.enum(LEAD_SOURCES, { error: 'Choose where the lead came from.' });
export type LeadSource = z.infer<typeof leadSourceSchema>;

export const LEAD_STAGES = ['new', 'contacted', 'site-visit', 'estimating', 'won', 'lost'] as const;
export const leadStageSchema = z.enum(LEAD_STAGES);
export type LeadStage = z.infer<typeof leadStageSchema>;

/** The stages a lead moves between by hand; won and lost are reached by their own commands. */
export const OPEN_LEAD_STAGES = ['new', 'contacted', 'site-visit', 'estimating'] as const;
export const openLeadStageSchema = z.enum(OPEN_LEAD_STAGES, { error: 'Choose a stage.' });
export type OpenLeadStage = z.infer<typeof openLeadStageSchema>;

export const LOST_REASONS = [
  'price',
  'timing',
  'went-elsewhere',
  'out-of-scope',
  'no-answer',
  'other',
] as const;
export const lostReasonSchema = z.enum(LOST_REASONS, { error: 'Choose why the lead was lost.' });
export type LostReason = z.infer<typeof lostReasonSchema>;

/** The fields of a lead that a person types. */
export const leadFieldsSchema = z.strictObject({
  title: lineSchema(120, 'The title'),
  contactName: lineSchema(120, 'The name'),
  company: optionalLineSchema(120, 'The company'),
  email: z.union([z.literal(''), emailSchema]).default(''),
  phone: optionalLineSchema(40, 'The phone number'),
  siteAddress: addressSchema.prefault({}),
  source: leadSourceSchema,
  nextStep: optionalLineSchema(160, 'The next step'),
  nextStepOn: dateSchema.nullable().default(null),
  /** A customer the shop knows already. */
  customerId: idSchema.nullable().default(null),
  expectedCents: nonNegativeCentsSchema.nullable().default(null),
});
export const createLeadSchema = leadFieldsSchema;
export type CreateLead = z.infer<typeof createLeadSchema>;
export type LeadInput = z.input<typeof createLeadSchema>;
export const updateLeadSchema = patchSchema(leadFieldsSchema);
export type UpdateLead = z.infer<typeof updateLeadSchema>;

// Commands. Each carries If-Match.

export const moveLeadSchema = z.strictObject({ stage: openLeadStageSchema });
export type MoveLead = z.infer<typeof moveLeadSchema>;

/** Won by hand: work agreed without an estimate of ours. Acceptance of an estimate wins its lead by itself. */
export const winLeadSchema = z.strictObject({});

export const loseLeadSchema = z.strictObject({ reason: lostReasonSchema, note: notesSchema(1000) });
export type LoseLead = z.infer<typeof loseLeadSchema>;

/** Takes a lost lead back to the stage it was lost from. */
export const reopenLeadSchema = z.strictObject({});

/** Makes the customer, and the site if given, or ties the lead to a customer the shop has already. */
export const convertLeadSchema = z
  .strictObject({
    customerId: idSchema.optional(),
    customer: createCustomerSchema.optional(),
    site: siteFieldsSchema.optional(),
  })
  .refine((convert) => (convert.customerId === undefined) !== (convert.customer === undefined), {
    error: 'Choose a customer or make a new one.',
    path: ['customerId'],
  });
export type ConvertLead = z.infer<typeof convertLeadSchema>;

/** Needs a customer on the lead. Moves the lead on to `estimating`. */
export const startEstimateSchema = z.strictObject({
  title: lineSchema(120, 'The title'),
  /** Left out: the lead's own site. */
  siteId: idSchema.nullable().optional(),
});
export type StartEstimate = z.infer<typeof startEstimateSchema>;
export const startedEstimateSchema = z.object({ estimateId: idSchema });
export type StartedEstimate = z.infer<typeof startedEstimateSchema>;

export const addLeadNoteSchema = z.strictObject({ body: paragraphSchema(4000, 'A note') });
export type AddLeadNote = z.infer<typeof addLeadNoteSchema>;

export const leadNoteSchema = z.object({
  id: idSchema,
  body: z.string(),
  by: z.string(),
  createdAt: instantSchema,
});
export type LeadNote = z.infer<typeof leadNoteSchema>;
export const leadNotesSchema = rowsSchema(leadNoteSchema);

/** A step from stage to stage. The first has no stage before it; the system takes a step when a customer accepts. */
export const leadStageChangeSchema = z.object({
  id: idSchema,
  fromStage: leadStageSchema.nullable(),
  toStage: leadStageSchema,
  by: z.string().nullable(),
  changedAt: instantSchema,
});
export type LeadStageChange = z.infer<typeof leadStageChangeSchema>;

const moneyOfLead = { expectedCents: nonNegativeCentsSchema.nullable().optional() };

export const leadSchema = z.object({
  id: idSchema,
  version: versionSchema,
  title: z.string(),
  contactName: z.string(),
  company: z.string(),
  email: z.string(),
  phone: z.string(),
  siteAddress: addressSchema,
  source: leadSourceSchema,
  stage: leadStageSchema,
  nextStep: z.string(),
  nextStepOn: dateSchema.nullable(),
  customerId: idSchema.nullable(),
  customerName: z.string().nullable(),
  siteId: idSchema.nullable(),
  siteName: z.string().nullable(),
  lostReason: lostReasonSchema.nullable(),
  lostNote: z.string(),
  stageChangedAt: instantSchema,
  createdAt: instantSchema,
  /** One step on: the estimates that were started from this lead. */
  estimates: z.array(z.object({ id: idSchema, number: z.int(), title: z.string() })),
  /** Every step it took, the oldest first. */
  stageChanges: z.array(leadStageChangeSchema),
  // money
  ...moneyOfLead,
});
export type Lead = z.infer<typeof leadSchema>;

export const leadRowSchema = z.object({
  id: idSchema,
  version: versionSchema,
  title: z.string(),
  contactName: z.string(),
  company: z.string(),
  phone: z.string(),
  source: leadSourceSchema,
  stage: leadStageSchema,
  nextStep: z.string(),
  nextStepOn: dateSchema.nullable(),
  createdAt: instantSchema,
  // money
  ...moneyOfLead,
});
export type LeadRow = z.infer<typeof leadRowSchema>;
export const leadPageSchema = pageSchema(leadRowSchema);

export const LEAD_SORT_KEYS = ['title', 'nextStepOn', 'createdAt'] as const;
export const leadListQuerySchema = listQuerySchema(LEAD_SORT_KEYS).extend({
  /** One stage, or `open` for all that are neither won nor lost. */
  stage: z.enum([...LEAD_STAGES, 'open']).optional(),
  source: leadSourceSchema.optional(),
  /** `overdue`: the date has passed; `due`: today or passed; `none`: open with no next step. */
  nextStep: z.enum(['overdue', 'due', 'none']).optional(),
});
export type LeadListQuery = z.infer<typeof leadListQuerySchema>;

export const leadExportQuerySchema = leadListQuerySchema.omit({ after: true, limit: true });
export type LeadExportQuery = z.infer<typeof leadExportQuerySchema>;

/** How many leads a column of the board shows before it points to the list. */
export const BOARD_COLUMN_LIMIT = 30;
export const leadBoardQuerySchema = leadListQuerySchema.pick({ q: true, source: true, nextStep: true });
export type LeadBoardQuery = z.infer<typeof leadBoardQuerySchema>;

/** The board shows what was won and lost in this many days. */
export const BOARD_CLOSED_DAYS = 90;
/** A column for every stage, in order; won and lost hold the last 90 days. Rows: the soonest next step first. */
export const leadBoardSchema = z.object({
  columns: z.array(
    z.object({
      stage: leadStageSchema,
      count: z.int(),
      rows: z.array(leadRowSchema).max(BOARD_COLUMN_LIMIT),
      // money
      expectedCents: centsSchema.optional(),
    }),
  ),
});
export type LeadBoard = z.infer<typeof leadBoardSchema>;
