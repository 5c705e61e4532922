import { inject } from '@angular/core';
import { Actions, createEffect, ofType } from '@ngrx/effects';
import { concatMap, map, switchMap, tap } from 'rxjs';
import { catchProblem } from '../../platform/api/catch-problem';
import { Notices } from '../../platform/page/notices';
import { AccountsApiClient } from '../accounts-api';
import { OwnSessionsApi, OwnSessionsPage } from './own-sessions.actions';

export const loadOwnSessions = createEffect(
  (actions$ = inject(Actions), accounts = inject(AccountsApiClient)) =>
    actions$.pipe(
      ofType(OwnSessionsPage.opened),
      switchMap(() =>
        accounts.sessions().pipe(
          map(({ rows }) => OwnSessionsApi.loaded({ sessions: rows })),
          catchProblem((problem) => OwnSessionsApi.loadFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

export const endOwnSession = createEffect(
  (actions$ = inject(Actions), accounts = inject(AccountsApiClient)) =>
    actions$.pipe(
      ofType(OwnSessionsPage.endPressed),
      concatMap(({ id }) =>
        accounts.endSession(id).pipe(
          map(() => OwnSessionsApi.ended({ id })),
          catchProblem((problem) => OwnSessionsApi.endFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

export const sayOwnSessionProblem = createEffect(
  (actions$ = inject(Actions), notices = inject(Notices)) =>
    actions$.pipe(
      ofType(OwnSessionsApi.endFailed),
      tap(({ problem }) => notices.problem(problem)),
    ),
  { functional: true, dispatch: false },
);
