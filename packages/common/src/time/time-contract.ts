import * as z from 'zod';
import {
  centsSchema,
  dateSchema,
  idSchema,
  instantSchema,
  optionalLineSchema,
  paragraphSchema,
  versionSchema,
} from '../wire/fields.js';
import { listQuerySchema, pageSchema } from '../wire/list.js';

export const TIME_KINDS = ['work', 'meal-break'] as const;
export const timeKindSchema = z.enum(TIME_KINDS);
export type TimeKind = z.infer<typeof timeKindSchema>;

/** Where the entry came from; `correction` is one that somebody entered afterwards. */
export const TIME_SOURCES = ['phone', 'desk', 'correction'] as const;
export const timeSourceSchema = z.enum(TIME_SOURCES);
export type TimeSource = z.infer<typeof timeSourceSchema>;
const punchSourceSchema = z.enum(['phone', 'desk']);

const noteSchema = optionalLineSchema(300, 'The note');

/**
 * Clock in, or switch: while an entry of the member is open it is closed at the same instant.
 *
 * The client makes the entry's id when the punch happens, so that a punch kept on a phone without a network and sent
 * twice makes one entry. `at` is the instant of the punch and may lie in the past.
 */
export const clockInSchema = z
  .strictObject({
    entryId: idSchema,
    /** Null for time that belongs to no job. */
    jobId: idSchema.nullable(),
    /** Null only for a meal break. */
    operationId: idSchema.nullable(),
    kind: timeKindSchema,
    at: instantSchema,
    source: punchSourceSchema,
    note: noteSchema,
  })
  .refine(
    (punch) => (punch.kind === 'work' ? punch.operationId !== null : !punch.jobId && !punch.operationId),
    {
      error: 'Work needs an operation; a meal break has neither a job nor an operation.',
      path: ['operationId'],
    },
  );
export type ClockIn = z.infer<typeof clockInSchema>;
export type ClockInInput = z.input<typeof clockInSchema>;

/**
 * Closes the entry in the address. It carries no version: a punch from a phone must land whatever was edited
 * meanwhile, and the second of two is answered with the entry as it stands.
 */
export const clockOutSchema = z.strictObject({ at: instantSchema, note: noteSchema.optional() });
export type ClockOut = z.infer<typeof clockOutSchema>;

const reasonSchema = paragraphSchema(300, 'The reason');

/** A forgotten stretch of time, entered afterwards. Without `memberId` it is one's own. */
export const addTimeEntrySchema = z
  .strictObject({
    memberId: idSchema.optional(),
    jobId: idSchema.nullable(),
    operationId: idSchema.nullable(),
    kind: timeKindSchema,
    startedAt: instantSchema,
    endedAt: instantSchema,
    note: noteSchema,
    reason: reasonSchema,
  })
  .refine(
    (entry) => (entry.kind === 'work' ? entry.operationId !== null : !entry.jobId && !entry.operationId),
    {
      error: 'Work needs an operation; a meal break has neither a job nor an operation.',
      path: ['operationId'],
    },
  );
export type AddTimeEntry = z.infer<typeof addTimeEntrySchema>;

/** What is left out stays. Carries If-Match. What it was before is kept in the entry's corrections. */
export const correctTimeEntrySchema = z.strictObject({
  jobId: idSchema.nullable().optional(),
  operationId: idSchema.nullable().optional(),
  kind: timeKindSchema.optional(),
  startedAt: instantSchema.optional(),
  /** Closes an entry that was left open; an entry cannot be opened again. */
  endedAt: instantSchema.optional(),
  note: z.string().trim().max(300, 'The note can have at most 300 characters.').optional(),
  reason: reasonSchema,
});
export type CorrectTimeEntry = z.infer<typeof correctTimeEntrySchema>;

/** Takes an entry out of every sum; it stays to be read, with the reason. Carries If-Match. */
export const voidTimeEntrySchema = z.strictObject({ reason: reasonSchema });
export type VoidTimeEntry = z.infer<typeof voidTimeEntrySchema>;

/** What a correction can change. */
export const timeEntryFactsSchema = z.object({
  jobId: idSchema.nullable(),
  operationId: idSchema.nullable(),
  kind: timeKindSchema,
  startedAt: instantSchema,
  endedAt: instantSchema.nullable(),
  note: z.string(),
});
export type TimeEntryFacts = z.infer<typeof timeEntryFactsSchema>;

/** One change after the fact. `before` is null on an entry that was added, `after` on one that was voided. */
export const correctionSchema = z.object({
  at: instantSchema,
  by: z.string(),
  reason: z.string(),
  before: timeEntryFactsSchema.nullable(),
  after: timeEntryFactsSchema.nullable(),
});
export type Correction = z.infer<typeof correctionSchema>;

export const timeEntryRowSchema = z.object({
  id: idSchema,
  version: versionSchema,
  memberId: idSchema,
  memberName: z.string(),
  jobId: idSchema.nullable(),
  jobNumber: z.int().nullable(),
  jobTitle: z.string().nullable(),
  operationId: idSchema.nullable(),
  operationName: z.string().nullable(),
  kind: timeKindSchema,
  startedAt: instantSchema,
  endedAt: instantSchema.nullable(),
  /** Whole elapsed minutes; null while it is open. */
  minutes: z.int().nullable(),
  note: z.string(),
  source: timeSourceSchema,
  corrected: z.boolean(),
  voidedAt: instantSchema.nullable(),
  // money
  costCents: centsSchema.nullable().optional(),
});
export type TimeEntryRow = z.infer<typeof timeEntryRowSchema>;
export const timeEntryPageSchema = pageSchema(timeEntryRowSchema);

export const timeEntrySchema = z.object({
  ...timeEntryRowSchema.shape,
  corrections: z.array(correctionSchema),
});
export type TimeEntry = z.infer<typeof timeEntrySchema>;

export const TIME_SORT_KEYS = ['startedAt'] as const;
export const timeListQuerySchema = listQuerySchema(TIME_SORT_KEYS).extend({
  memberId: idSchema.optional(),
  jobId: idSchema.optional(),
  operationId: idSchema.optional(),
  /** Days in the shop's zone, both included. */
  from: dateSchema.optional(),
  to: dateSchema.optional(),
});
export type TimeListQuery = z.infer<typeof timeListQuerySchema>;
