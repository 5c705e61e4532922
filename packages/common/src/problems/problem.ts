import * as z from 'zod';

/**
 * What the API answers when it refuses: an RFC 9457 problem document. `code` is stable and for programs, `detail` is a
 * sentence for the person, `fields` says what is wrong where (a dotted path into the request body).
 */
export const problemSchema = z.object({
  type: z.string(),
  title: z.string(),
  status: z.int(),
  code: z.string(),
  detail: z.string(),
  fields: z.array(z.object({ path: z.string(), message: z.string() })).optional(),
  /** The request's id, shown to the person as the reference number of a fault. */
  reference: z.string().optional(),
  /** Facts a program may act on, such as the current version of a row after a conflict. */
  facts: z.record(z.string(), z.unknown()).optional(),
});
export type Problem = z.infer<typeof problemSchema>;
export type FieldProblem = { path: string; message: string };

/** Every code with its HTTP status and title: the one list, used by the server's handler and the client's messages. */
export const PROBLEMS = {
  'malformed-request': { status: 400, title: 'The request could not be read' },
  'idempotency-key-missing': { status: 400, title: 'The request needs an idempotency key' },
  'not-signed-in': { status: 401, title: 'Sign in first' },
  'wrong-credentials': { status: 401, title: 'E-mail or password is wrong' },
  'subscription-lapsed': { status: 402, title: 'The subscription has lapsed' },
  'not-allowed': { status: 403, title: 'Not allowed' },
  'cross-site': { status: 403, title: 'The request did not come from this site' },
  'not-found': { status: 404, title: 'Not found' },
  'link-expired': { status: 410, title: 'This link no longer works' },
  conflict: { status: 409, title: 'This cannot be done now' },
  'in-progress': { status: 409, title: 'The same request is still being worked on' },
  'stale-version': { status: 412, title: 'Somebody changed this meanwhile' },
  'too-large': { status: 413, title: 'Too large' },
  'unsupported-type': { status: 415, title: 'This kind of content is not accepted' },
  'invalid-input': { status: 422, title: 'Something needs correcting' },
  'version-missing': { status: 428, title: 'The request must say which version it changes' },
  'too-many-requests': { status: 429, title: 'Too many tries' },
  fault: { status: 500, title: 'Something went wrong here' },
  'not-ready': { status: 503, title: 'Not ready' },
} as const satisfies Record<string, { status: number; title: string }>;
export type ProblemCode = keyof typeof PROBLEMS;

/** What a rule answers when the trade, the books or the law refuse: thrown by services as a problem, never a fault. */
export type Refusal = { code: ProblemCode; detail: string; fields?: FieldProblem[] };
