import * as z from 'zod';
import { centsSchema, dateSchema, idSchema, roleSchema } from '../wire/fields.js';
import { timeEntryRowSchema } from './time-contract.js';

export const weekQuerySchema = z.strictObject({
  /** Any day of the week wanted; the current week when left out. */
  of: dateSchema.optional(),
});
export type WeekQuery = z.infer<typeof weekQuerySchema>;

/** A day of the shop's zone: 23, 24 or 25 hours long. An entry across midnight counts in both days, each its part. */
export const weekDaySchema = z.object({
  on: dateSchema,
  workMinutes: z.int(),
  mealBreakMinutes: z.int(),
});
export type WeekDay = z.infer<typeof weekDaySchema>;

const weekFrame = {
  /** The first and the last day of the workweek, seven days in all. */
  startsOn: dateSchema,
  endsOn: dateSchema,
  timeZone: z.string(),
};

/** One member's week: one's own, or anyone's for who may read it. Open and voided entries count in no sum. */
export const memberWeekSchema = z.object({
  memberId: idSchema,
  memberName: z.string(),
  ...weekFrame,
  days: z.array(weekDaySchema).length(7),
  workMinutes: z.int(),
  mealBreakMinutes: z.int(),
  entries: z.array(timeEntryRowSchema),
});
export type MemberWeek = z.infer<typeof memberWeekSchema>;

/** Everybody's week, a row a member. */
export const shopWeekSchema = z.object({
  ...weekFrame,
  members: z.array(
    z.object({
      memberId: idSchema,
      memberName: z.string(),
      role: roleSchema,
      days: z.array(weekDaySchema).length(7),
      workMinutes: z.int(),
      mealBreakMinutes: z.int(),
      /** An entry of this week was never clocked out, or is running now. */
      hasOpenEntry: z.boolean(),
      // money
      costCents: centsSchema.optional(),
    }),
  ),
  workMinutes: z.int(),
});
export type ShopWeek = z.infer<typeof shopWeekSchema>;
