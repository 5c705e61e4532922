import type { FieldProblem, Problem } from '@bookmatch/common/problems/problem';
import { NO_CONNECTION } from './api-problem';

/** The problems a screen treats in its own way; all others show their sentence. */

export const isSignedOut = (problem: Problem): boolean => problem.code === 'not-signed-in';
/** The anti-forgery cookie was gone or old; the refusal brought a new one. */
export const isUnverified = (problem: Problem): boolean => problem.code === 'cross-site';
export const isNotFound = (problem: Problem): boolean => problem.status === 404;
export const isStale = (problem: Problem): boolean => problem.code === 'stale-version';
export const isNoConnection = (problem: Problem): boolean => problem.code === NO_CONNECTION;

/** True when nobody can know whether the request took effect: it must be repeated with the same key. */
export const isUncertain = (problem: Problem): boolean => problem.status === 0 || problem.status >= 500;

export const fieldProblems = (problem: Problem | null): readonly FieldProblem[] => problem?.fields ?? [];
