import { inject } from '@angular/core';
import { Actions, createEffect, ofType } from '@ngrx/effects';
import { catchError, map, of, switchMap, tap } from 'rxjs';
import { toProblem } from '../api/api-problem';
import { catchProblem } from '../api/catch-problem';
import { isSignedOut } from '../api/problem-kinds';
import { PageLoad } from './page-load';
import { SessionApiClient } from './session-api';
import { SessionApi, SessionPage } from './session.actions';

export const loadSession = createEffect(
  (actions$ = inject(Actions), api = inject(SessionApiClient)) =>
    actions$.pipe(
      ofType(SessionPage.started, SessionPage.signedIn, SessionPage.shopChanged),
      switchMap(() =>
        api.read().pipe(
          map((session) => SessionApi.loaded({ session })),
          catchError((error: unknown) => {
            const problem = toProblem(error);
            return of(isSignedOut(problem) ? SessionApi.missing() : SessionApi.loadFailed({ problem }));
          }),
        ),
      ),
    ),
  { functional: true },
);

export const signOut = createEffect(
  (actions$ = inject(Actions), api = inject(SessionApiClient)) =>
    actions$.pipe(
      ofType(SessionPage.signOutPressed),
      switchMap(({ everywhere }) =>
        api.signOut(everywhere).pipe(
          map(() => SessionApi.signedOut()),
          catchProblem((problem) => SessionApi.signOutFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

/** A full load: after it, the back button finds nothing of the shop on the page. */
export const leaveWhenSignedOut = createEffect(
  (actions$ = inject(Actions), page = inject(PageLoad)) =>
    actions$.pipe(
      ofType(SessionApi.signedOut),
      tap(() => page.go('/sign-in')),
    ),
  { functional: true, dispatch: false },
);
