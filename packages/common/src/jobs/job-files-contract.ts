import * as z from 'zod';
import { idSchema, instantSchema } from '../wire/fields.js';
import { rowsSchema } from '../wire/list.js';

/** What a job keeps. The type is told by the content's first bytes, never by the name. */
export const JOB_FILE_TYPES = [
  'image/jpeg',
  'image/png',
  'image/webp',
  'image/heic',
  'application/pdf',
  'text/plain',
  'text/csv',
  'application/zip',
] as const;
export const MAX_JOB_FILE_BYTES = 25 * 1024 * 1024;

/** Files are sent as `multipart/form-data` with one part `file`; name and type are taken from it and checked. */
export const jobFileSchema = z.object({
  id: idSchema,
  name: z.string(),
  mediaType: z.string(),
  bytes: z.int(),
  sha256: z.string(),
  hasThumbnail: z.boolean(),
  uploadedBy: z.string(),
  createdAt: instantSchema,
});
export type JobFile = z.infer<typeof jobFileSchema>;
export const jobFilesSchema = rowsSchema(jobFileSchema);
