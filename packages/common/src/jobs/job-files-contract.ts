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
  'image/vnd.dxf',
] as const;
export const jobFileTypeSchema = z.enum(JOB_FILE_TYPES);
export type JobFileType = z.infer<typeof jobFileTypeSchema>;
/** The types a browser shows; the others are only handed out to keep. */
export const JOB_PHOTO_TYPES: readonly JobFileType[] = ['image/jpeg', 'image/png', 'image/webp'];

export const MAX_JOB_FILE_BYTES = 25 * 1024 * 1024;

/** Files are sent as `multipart/form-data` with one part `file`; name and type are taken from it and checked. */
export const jobFileSchema = z.object({
  id: idSchema,
  name: z.string(),
  mediaType: jobFileTypeSchema,
  bytes: z.int(),
  sha256: z.string(),
  hasThumbnail: z.boolean(),
  uploadedBy: z.string(),
  createdAt: instantSchema,
});
export type JobFile = z.infer<typeof jobFileSchema>;
/** The same content sent twice is one file: then the answer is the file that is there. */
export const uploadedJobFileSchema = jobFileSchema.extend({ alreadyHere: z.boolean() });
export type UploadedJobFile = z.infer<typeof uploadedJobFileSchema>;
export const jobFilesSchema = rowsSchema(jobFileSchema);
