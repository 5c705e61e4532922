import type { Problem } from '@bookmatch/common/problems/problem';
import { catchError, of, type OperatorFunction } from 'rxjs';
import { toProblem } from './api-problem';

/** In an effect: turns a failure into an action, so that the effect lives on. */
export function catchProblem<In, Out>(onProblem: (problem: Problem) => Out): OperatorFunction<In, In | Out> {
  return catchError((error: unknown) => of(onProblem(toProblem(error))));
}
