import * as z from 'zod';
import { idSchema } from '../wire/fields.js';
import { timeEntryRowSchema } from './time-contract.js';

/** Something the member can clock in to with one touch. */
export const clockChoiceSchema = z.object({
  jobId: idSchema.nullable(),
  jobNumber: z.int().nullable(),
  jobTitle: z.string().nullable(),
  operationId: idSchema,
  operationName: z.string(),
  /** Planned less clocked, by everybody; below zero when over; null when nothing was planned. */
  minutesLeft: z.int().nullable(),
  /** The member clocked to it in the last days. */
  recent: z.boolean(),
});
export type ClockChoice = z.infer<typeof clockChoiceSchema>;

/** The clock of the one who asks. Costs are never in it, whoever asks. */
export const clockStateSchema = z.object({
  open: timeEntryRowSchema.omit({ costCents: true }).nullable(),
  /** Work of today in the shop's zone, in entries that are closed; the open one is added by the clock that shows it. */
  todayMinutes: z.int(),
  /** Recent ones first, then those of assigned jobs, then what belongs to no job. */
  choices: z.array(clockChoiceSchema),
});
export type ClockState = z.infer<typeof clockStateSchema>;

/** Answer of clock in and clock out: what the punch made of the clock. */
export const punchedSchema = z.object({
  entry: timeEntryRowSchema.omit({ costCents: true }),
  clock: clockStateSchema,
});
export type Punched = z.infer<typeof punchedSchema>;

/** Every job the member may clock in to, for whoever works on something that is not among the choices. */
export const clockJobsSchema = z.object({
  jobs: z.array(
    z.object({
      jobId: idSchema,
      jobNumber: z.int(),
      jobTitle: z.string(),
      /** What was planned on it, in the shop's order. */
      planned: z.array(z.object({ operationId: idSchema, minutesLeft: z.int() })),
    }),
  ),
  /** The shop's operations in its order: a job may need one that was not planned, and some belong to no job. */
  operations: z.array(z.object({ operationId: idSchema, operationName: z.string(), onJob: z.boolean() })),
});
export type ClockJobs = z.infer<typeof clockJobsSchema>;
