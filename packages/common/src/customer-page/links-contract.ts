import * as z from 'zod';
import { idSchema, instantSchema } from '../wire/fields.js';
import { rowsSchema } from '../wire/list.js';

export const LINK_SUBJECTS = ['estimate', 'invoice'] as const;
export const linkSubjectSchema = z.enum(LINK_SUBJECTS);
export type LinkSubject = z.infer<typeof linkSubjectSchema>;

/** A customer's way in, as the shop sees it. The secret part is not kept, so an old link cannot be shown again. */
export const linkSchema = z.object({
  id: idSchema,
  subject: linkSubjectSchema,
  subjectId: idSchema,
  createdAt: instantSchema,
  expiresAt: instantSchema,
  revokedAt: instantSchema.nullable(),
  lastSeenAt: instantSchema.nullable(),
});
export type Link = z.infer<typeof linkSchema>;
export const linksSchema = rowsSchema(linkSchema);

export const linkQuerySchema = z.strictObject({ subject: linkSubjectSchema, subjectId: idSchema });
export type LinkQuery = z.infer<typeof linkQuerySchema>;

export const createLinkSchema = z.strictObject({ subject: linkSubjectSchema, subjectId: idSchema });
export type CreateLink = z.infer<typeof createLinkSchema>;

/** The one time that the address is given. */
export const createdLinkSchema = linkSchema.extend({ url: z.url() });
export type CreatedLink = z.infer<typeof createdLinkSchema>;
