import { PROBLEMS, type Problem } from '@bookmatch/common/problems/problem';
import type { ErrorRequestHandler, Response } from 'express';
import type { Logger } from '../log/logger.js';
import { maskedUrl } from '../log/masked-url.js';
import { ProblemError } from './problem-error.js';
import { isProviderDown } from '../payments/provider-down.js';
import { isBrokenReference, isDuplicateKey } from '../database/retry.js';

/** The last middleware: turns whatever was thrown into a problem document. Faults are logged once, with a reference. */
export function problemHandler(log: Logger): ErrorRequestHandler {
  return (error: unknown, request, response, next) => {
    if (response.headersSent) {
      next(error);
      return;
    }
    const problem = toProblem(error);
    const reference = String(request.id);
    if (problem.code === 'fault')
      log.error({ err: error, requestId: reference, url: maskedUrl(request.originalUrl) }, 'fault');
    sendProblem(response, problem, reference);
  };
}

export function sendProblem(response: Response, problem: ProblemError, reference: string): void {
  const { status, title } = PROBLEMS[problem.code];
  const body: Problem = {
    type: `/problems/${problem.code}`,
    title,
    status,
    code: problem.code,
    detail: problem.detail,
    reference,
    ...(problem.extra.fields ? { fields: problem.extra.fields } : {}),
    ...(problem.extra.facts ? { facts: problem.extra.facts } : {}),
  };
  response
    .status(status)
    .set({ 'Cache-Control': 'no-store', ...problem.extra.headers })
    .type('application/problem+json')
    .send(JSON.stringify(body));
}

function toProblem(error: unknown): ProblemError {
  if (error instanceof ProblemError) return error;
  if (isBrokenReference(error))
    return new ProblemError('not-found', 'Something this refers to does not exist.');
  if (isDuplicateKey(error)) return new ProblemError('conflict', 'This exists already.');
  if (isProviderDown(error))
    return new ProblemError('not-ready', 'The payment provider does not answer. Try again in a minute.');
  return (
    fromParser(error) ?? new ProblemError('fault', 'Something went wrong on our side. Nothing was changed.')
  );
}

/** What express's own parsers throw carries a status; its message may quote the input, so we say our own. */
function fromParser(error: unknown): ProblemError | null {
  const { status, type } = (error ?? {}) as { status?: unknown; type?: unknown; code?: unknown };
  if ((error as { code?: unknown } | null)?.code === 'LIMIT_FILE_SIZE' || status === 413)
    return new ProblemError('too-large', 'This is larger than what is accepted.');
  if (status === 415) return new ProblemError('unsupported-type', 'This kind of content is not accepted.');
  if (typeof status === 'number' && status >= 400 && status < 500)
    return new ProblemError(
      'malformed-request',
      type === 'entity.parse.failed' ? 'This is not valid JSON.' : 'The request could not be read.',
    );
  if (error instanceof URIError)
    return new ProblemError('malformed-request', 'The address could not be read.');
  return null;
}
