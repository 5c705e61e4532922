import * as z from 'zod';
import { idSchema } from '../wire/fields.js';
import { rowsSchema } from '../wire/list.js';

export const FOUND_KINDS = ['customer', 'lead', 'estimate', 'job', 'invoice'] as const;
export const foundKindSchema = z.enum(FOUND_KINDS);
export type FoundKind = z.infer<typeof foundKindSchema>;

/** A number finds what bears it; text finds titles and names. Only kinds that the one who asks may read. */
export const quickFindQuerySchema = z.strictObject({
  q: z.string().trim().min(1, 'Type something to find.').max(100, 'Search for at most 100 characters.'),
});
export type QuickFindQuery = z.infer<typeof quickFindQuerySchema>;

export const foundSchema = z.object({
  kind: foundKindSchema,
  id: idSchema,
  title: z.string(),
  /** What tells two of a name apart: the customer, the stage. Never money. */
  line: z.string(),
  number: z.int().nullable(),
});
export type Found = z.infer<typeof foundSchema>;
/** At most 20, the best match first. */
export const quickFindSchema = rowsSchema(foundSchema);
