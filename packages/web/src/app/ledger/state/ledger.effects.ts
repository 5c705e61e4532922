import { inject } from '@angular/core';
import { Actions, createEffect, ofType } from '@ngrx/effects';
import { map, switchMap } from 'rxjs';
import { catchProblem } from '../../platform/api/catch-problem';
import { LedgerApiClient } from '../ledger-api';
import { LedgerApi, LedgerPage } from './ledger.actions';

export const loadBalance = createEffect(
  (actions$ = inject(Actions), api = inject(LedgerApiClient)) =>
    actions$.pipe(
      ofType(LedgerPage.balanceOpened),
      switchMap(({ query }) =>
        api.trialBalance(query).pipe(
          map((balance) => LedgerApi.balanceLoaded({ balance })),
          catchProblem((problem) => LedgerApi.balanceFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

export const loadEntries = createEffect(
  (actions$ = inject(Actions), api = inject(LedgerApiClient)) =>
    actions$.pipe(
      ofType(LedgerPage.entriesOpened),
      switchMap(({ query }) =>
        api.entries(query).pipe(
          map((page) => LedgerApi.entriesLoaded({ page })),
          catchProblem((problem) => LedgerApi.entriesFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

export const loadEntry = createEffect(
  (actions$ = inject(Actions), api = inject(LedgerApiClient)) =>
    actions$.pipe(
      ofType(LedgerPage.entryOpened),
      switchMap(({ id }) =>
        api.entry(id).pipe(
          map((entry) => LedgerApi.entryLoaded({ entry })),
          catchProblem((problem) => LedgerApi.entryFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

export const loadActivity = createEffect(
  (actions$ = inject(Actions), api = inject(LedgerApiClient)) =>
    actions$.pipe(
      ofType(LedgerPage.activityOpened),
      switchMap(({ code, query }) =>
        api.activity(code, query).pipe(
          map((activity) => LedgerApi.activityLoaded({ activity })),
          catchProblem((problem) => LedgerApi.activityFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);
