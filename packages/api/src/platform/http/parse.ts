import type { Request } from 'express';
import * as z from 'zod';
import { idSchema } from '@bookmatch/common/wire/fields';
import { plainMessage } from '@bookmatch/common/wire/plain-messages';
import { notFound, ProblemError } from './problem-error.js';

const IS_ID = /^(?:id|.*Id)$/;

/** The path's parameters. One that should be an id and is none answers 404, like an id that does not exist. */
export function parseParams(request: Request): Record<string, string> {
  const params = request.params as Record<string, string>;
  for (const [name, value] of Object.entries(params))
    if (IS_ID.test(name) && !idSchema.safeParse(value).success) throw notFound();
  return params;
}

/** The query: unknown keys, repeated keys and wrong values answer 400. */
export function parseQuery(schema: z.ZodType | undefined, query: unknown): unknown {
  const parsed = (schema ?? z.strictObject({})).safeParse(query, { error: plainMessage });
  if (parsed.success) return parsed.data;
  throw new ProblemError('malformed-request', firstMessage(parsed.error), { fields: fieldsOf(parsed.error) });
}

/** The body: unknown keys and wrong values answer 422 with each field's own message. */
export function parseBody(schema: z.ZodType | undefined, body: unknown): unknown {
  if (!schema) return undefined;
  const parsed = schema.safeParse(body ?? {}, { error: plainMessage });
  if (parsed.success) return parsed.data;
  throw new ProblemError('invalid-input', firstMessage(parsed.error), { fields: fieldsOf(parsed.error) });
}

function fieldsOf(error: z.ZodError) {
  return error.issues.slice(0, 50).flatMap((issue) =>
    issue.code === 'unrecognized_keys'
      ? issue.keys.map((key) => ({
          path: [...issue.path, key].map(String).join('.'),
          message: 'This is not a field of this form.',
        }))
      : [{ path: issue.path.map(String).join('.'), message: issue.message }],
  );
}

function firstMessage(error: z.ZodError): string {
  const fields = fieldsOf(error);
  return fields.length === 1 ? (fields[0]?.message ?? '') : `${fields.length} fields need correcting.`;
}

/** `If-Match: "7"` → 7. @throws version-missing, malformed-request */
export function parseVersion(request: Request): number {
  const header = request.get('if-match');
  if (header === undefined)
    throw new ProblemError('version-missing', 'Send the version you are changing in If-Match.');
  const match = /^"(\d{1,9})"$/.exec(header);
  if (!match) throw new ProblemError('malformed-request', 'If-Match must be one quoted version.');
  return Number(match[1]);
}

/** @throws idempotency-key-missing, malformed-request */
export function parseIdempotencyKey(request: Request): string {
  const key = request.get('idempotency-key');
  if (key === undefined)
    throw new ProblemError('idempotency-key-missing', 'Send an Idempotency-Key with this request.');
  if (!/^[\w.-]{8,64}$/.test(key))
    throw new ProblemError(
      'malformed-request',
      'An Idempotency-Key has 8 to 64 letters, digits, dots, dashes or underscores.',
    );
  return key;
}
