import { inject } from '@angular/core';
import { Actions, createEffect, ofType } from '@ngrx/effects';
import { exhaustMap, map, switchMap } from 'rxjs';
import { catchProblem } from '../../platform/api/catch-problem';
import { CustomerPageApiClient } from '../customer-page-api';
import { CustomerPageApi, CustomerScreen } from './customer-page.actions';

export const load = createEffect(
  (actions$ = inject(Actions), api = inject(CustomerPageApiClient)) =>
    actions$.pipe(
      ofType(CustomerScreen.opened),
      switchMap(({ token }) =>
        api.read(token).pipe(
          map((page) => CustomerPageApi.loaded({ page })),
          catchProblem((problem) => CustomerPageApi.loadFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

/** A second press while the first is under way is no second yes. */
export const accept = createEffect(
  (actions$ = inject(Actions), api = inject(CustomerPageApiClient)) =>
    actions$.pipe(
      ofType(CustomerScreen.accepted),
      exhaustMap(({ token, acceptance }) =>
        api.accept(token, acceptance).pipe(
          map((estimate) => CustomerPageApi.answered({ estimate })),
          catchProblem((problem) => CustomerPageApi.answerFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

export const decline = createEffect(
  (actions$ = inject(Actions), api = inject(CustomerPageApiClient)) =>
    actions$.pipe(
      ofType(CustomerScreen.declined),
      exhaustMap(({ token, refusal }) =>
        api.decline(token, refusal).pipe(
          map((estimate) => CustomerPageApi.answered({ estimate })),
          catchProblem((problem) => CustomerPageApi.answerFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

export const ask = createEffect(
  (actions$ = inject(Actions), api = inject(CustomerPageApiClient)) =>
    actions$.pipe(
      ofType(CustomerScreen.asked),
      exhaustMap(({ token, body }) =>
        api.ask(token, body).pipe(
          map((question) => CustomerPageApi.questionKept({ question })),
          catchProblem((problem) => CustomerPageApi.questionFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);
