import {
  PROBLEMS,
  type FieldProblem,
  type ProblemCode,
  type Refusal,
} from '@bookmatch/common/problems/problem';

/** An expected refusal, thrown anywhere below a route and answered as a problem document. */
export class ProblemError extends Error {
  readonly status: number;

  constructor(
    readonly code: ProblemCode,
    readonly detail: string,
    readonly extra: {
      fields?: FieldProblem[];
      facts?: Record<string, unknown>;
      headers?: Record<string, string>;
    } = {},
  ) {
    super(detail);
    this.name = 'ProblemError';
    this.status = PROBLEMS[code].status;
  }
}

export const notFound = (what = 'This'): ProblemError =>
  new ProblemError('not-found', `${what} does not exist, or it is not yours.`);
export const notAllowed = (detail = 'Your role in this shop does not include this.'): ProblemError =>
  new ProblemError('not-allowed', detail);
export const conflict = (detail: string, facts?: Record<string, unknown>): ProblemError =>
  new ProblemError('conflict', detail, facts ? { facts } : {});
export const invalid = (path: string, message: string): ProblemError =>
  new ProblemError('invalid-input', message, { fields: [{ path, message }] });

/** Throws what a rule refused; a rule answers null when it has nothing against it. */
export function refuse(refusal: Refusal | null): void {
  if (refusal)
    throw new ProblemError(refusal.code, refusal.detail, refusal.fields ? { fields: refusal.fields } : {});
}
