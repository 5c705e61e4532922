import { inject } from '@angular/core';
import { Actions, createEffect, ofType } from '@ngrx/effects';
import type { Action } from '@ngrx/store';
import { concatMap, exhaustMap, filter, map, switchMap, tap } from 'rxjs';
import { catchProblem } from '../../platform/api/catch-problem';
import { Notices } from '../../platform/page/notices';
import { ShopsApiClient } from '../shops-api';
import { OperationsApi, OperationsPage } from './operations.actions';

export const loadOperations = createEffect(
  (actions$ = inject(Actions), api = inject(ShopsApiClient)) =>
    actions$.pipe(
      ofType(OperationsPage.opened),
      switchMap(() =>
        api.operations().pipe(
          map(({ rows }) => OperationsApi.loaded({ operations: rows })),
          catchProblem((problem) => OperationsApi.loadFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

export const addOperation = createEffect(
  (actions$ = inject(Actions), api = inject(ShopsApiClient)) =>
    actions$.pipe(
      ofType(OperationsPage.addSubmitted),
      exhaustMap(({ fields }) =>
        api.addOperation(fields).pipe(
          map((operation) => OperationsApi.saved({ operation })),
          catchProblem((problem) => OperationsApi.saveFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

export const changeOperation = createEffect(
  (actions$ = inject(Actions), api = inject(ShopsApiClient)) =>
    actions$.pipe(
      ofType(OperationsPage.changeSubmitted),
      exhaustMap(({ operation, fields }) =>
        api.changeOperation(operation, fields).pipe(
          map((changed) => OperationsApi.saved({ operation: changed })),
          catchProblem((problem) => OperationsApi.saveFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

export const archiveOperation = createEffect(
  (actions$ = inject(Actions), api = inject(ShopsApiClient)) =>
    actions$.pipe(
      ofType(OperationsPage.archiveSet),
      concatMap(({ operation, archived }) =>
        api.changeOperation(operation, { archived }).pipe(
          map((changed) => OperationsApi.archived({ operation: changed })),
          catchProblem((problem) => OperationsApi.commandFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

/** One order after the other: the last one that was put stands in the end. */
export const reorderOperations = createEffect(
  (actions$ = inject(Actions), api = inject(ShopsApiClient)) =>
    actions$.pipe(
      ofType(OperationsPage.moved),
      concatMap(({ operationIds }) =>
        api.reorderOperations(operationIds).pipe(
          map(({ rows }) => OperationsApi.reordered({ operations: rows })),
          catchProblem((problem) => OperationsApi.commandFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

/** What was shown in advance may not hold: the list is read again. */
export const reloadOperationsAfterRefusal = createEffect(
  (actions$ = inject(Actions)) =>
    actions$.pipe(
      ofType(OperationsApi.commandFailed),
      map(() => OperationsPage.opened()),
    ),
  { functional: true },
);

const DONE: Record<string, string> = {
  [OperationsApi.saved.type]: 'Operation saved.',
  [OperationsApi.archived.type]: 'Operation changed.',
};

export const sayOperationDone = createEffect(
  (actions$ = inject(Actions), notices = inject(Notices)) =>
    actions$.pipe(
      map(({ type }: Action) => DONE[type]),
      filter((message) => message !== undefined),
      tap((message) => notices.say(message)),
    ),
  { functional: true, dispatch: false },
);

export const sayOperationProblem = createEffect(
  (actions$ = inject(Actions), notices = inject(Notices)) =>
    actions$.pipe(
      ofType(OperationsApi.commandFailed),
      tap(({ problem }) => notices.problem(problem)),
    ),
  { functional: true, dispatch: false },
);
