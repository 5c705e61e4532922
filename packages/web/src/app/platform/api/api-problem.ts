import { HttpErrorResponse } from '@angular/common/http';
import { problemSchema, type Problem } from '@bookmatch/common/problems/problem';

/** The client's own code beside the server's: no answer came at all. */
export const NO_CONNECTION = 'no-connection';

/** A refusal or a fault as an error, so that it travels through observables and promises. */
export class ApiProblem extends Error {
  constructor(readonly problem: Problem) {
    super(problem.detail);
    this.name = 'ApiProblem';
  }
}

/** Whatever was thrown, as a problem document: plain data that fits into the store and onto the screen. */
export function toProblem(error: unknown): Problem {
  if (error instanceof ApiProblem) return error.problem;
  if (error instanceof HttpErrorResponse) return fromAnswer(error);
  globalThis.reportError?.(error);
  return fault();
}

function fromAnswer(answer: HttpErrorResponse): Problem {
  if (answer.status === 0) return noConnection();
  const body = problemSchema.safeParse(parsed(answer.error));
  return body.success ? body.data : fault(answer.status);
}

/** Angular hands over the body of a failed request as text when a text was asked for. */
function parsed(body: unknown): unknown {
  if (typeof body !== 'string') return body;
  try {
    return JSON.parse(body);
  } catch {
    return null;
  }
}

function noConnection(): Problem {
  return {
    type: 'about:blank',
    title: 'No connection',
    status: 0,
    code: NO_CONNECTION,
    detail: 'There is no connection right now. Nothing you typed is lost. Try again in a moment.',
  };
}

function fault(status = 500): Problem {
  return {
    type: 'about:blank',
    title: 'Something went wrong here',
    status,
    code: 'fault',
    detail: 'Something went wrong on our side. Try again, and tell us if it stays.',
  };
}
