import * as z from 'zod';
import { idSchema, instantSchema, paragraphSchema } from '../wire/fields.js';

/** A question the customer asked on the page of an estimate, and the shop's answer once there is one. */
export const questionSchema = z.object({
  id: idSchema,
  body: z.string(),
  askedAt: instantSchema,
  answer: z.string().nullable(),
  answeredBy: z.string().nullable(),
  answeredAt: instantSchema.nullable(),
});
export type Question = z.infer<typeof questionSchema>;

export const askQuestionSchema = z.strictObject({ body: paragraphSchema(2000, 'The question') });
export type AskQuestion = z.infer<typeof askQuestionSchema>;

export const answerQuestionSchema = z.strictObject({ body: paragraphSchema(2000, 'The answer') });
export type AnswerQuestion = z.infer<typeof answerQuestionSchema>;
