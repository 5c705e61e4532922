import { tmpdir } from 'node:os';
import type { Request } from 'express';
import multer from 'multer';
import { ProblemError } from './problem-error.js';
import type { UploadedFile } from './route.js';

/** The largest file a job takes. */
export const MAX_UPLOAD_BYTES = 25 * 1024 * 1024;

export type UploadReader = (request: Request) => Promise<UploadedFile>;

/** Reads one file of a form onto the disk, never into memory. The name is kept as text and is never part of a path. */
export function createUploadReader(): UploadReader {
  const read = multer({
    dest: tmpdir(),
    limits: { fileSize: MAX_UPLOAD_BYTES, files: 1, fields: 5, fieldSize: 2000, parts: 6, headerPairs: 50 },
    defParamCharset: 'utf8',
  }).single('file');
  return async (request) => {
    await new Promise<void>((resolve, reject) => {
      read(request, {} as never, (error: unknown) => (error ? reject(toProblem(error)) : resolve()));
    });
    const { file } = request;
    if (!file)
      throw new ProblemError('invalid-input', 'Choose a file.', {
        fields: [{ path: 'file', message: 'Choose a file.' }],
      });
    return { path: file.path, name: file.originalname, bytes: file.size };
  };
}

function toProblem(error: unknown): Error {
  const { code } = error as { code?: unknown };
  if (code === 'LIMIT_FILE_SIZE') return new ProblemError('too-large', 'A file can have at most 25 MB.');
  if (typeof code === 'string' && code.startsWith('LIMIT_'))
    return new ProblemError('malformed-request', 'Send one file at a time.');
  return new ProblemError('malformed-request', 'The upload could not be read.');
}
