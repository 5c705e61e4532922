import { inject } from '@angular/core';
import { Actions, createEffect, ofType } from '@ngrx/effects';
import type { Action } from '@ngrx/store';
import { concatMap, exhaustMap, filter, map, switchMap, tap } from 'rxjs';
import { catchProblem } from '../../platform/api/catch-problem';
import { isStale } from '../../platform/api/problem-kinds';
import { Notices } from '../../platform/page/notices';
import { TimeApiClient } from '../time-api';
import { WeeksApi, WeeksPage } from './weeks.actions';

export const loadMemberWeek = createEffect(
  (actions$ = inject(Actions), api = inject(TimeApiClient)) =>
    actions$.pipe(
      ofType(WeeksPage.memberWeekOpened),
      switchMap(({ memberId, of }) =>
        api.memberWeek(memberId, of).pipe(
          map((week) => WeeksApi.memberWeekLoaded({ week })),
          catchProblem((problem) => WeeksApi.memberWeekFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

export const loadShopWeek = createEffect(
  (actions$ = inject(Actions), api = inject(TimeApiClient)) =>
    actions$.pipe(
      ofType(WeeksPage.shopWeekOpened),
      switchMap(({ of }) =>
        api.shopWeek(of).pipe(
          map((week) => WeeksApi.shopWeekLoaded({ week })),
          catchProblem((problem) => WeeksApi.shopWeekFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

export const loadList = createEffect(
  (actions$ = inject(Actions), api = inject(TimeApiClient)) =>
    actions$.pipe(
      ofType(WeeksPage.listOpened),
      switchMap(({ query }) =>
        api.list(query).pipe(
          map((page) => WeeksApi.listLoaded({ page })),
          catchProblem((problem) => WeeksApi.listFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

export const loadEntry = createEffect(
  (actions$ = inject(Actions), api = inject(TimeApiClient)) =>
    actions$.pipe(
      ofType(WeeksPage.formOpened),
      map(({ entryId }) => entryId),
      filter((entryId) => entryId !== null),
      switchMap((entryId) =>
        api.entry(entryId).pipe(
          map((entry) => WeeksApi.entryLoaded({ entry })),
          catchProblem((problem) => WeeksApi.entryFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

export const loadWork = createEffect(
  (actions$ = inject(Actions), api = inject(TimeApiClient)) =>
    actions$.pipe(
      ofType(WeeksPage.workWanted),
      exhaustMap(() =>
        api.clockJobs().pipe(
          map((work) => WeeksApi.workLoaded({ work })),
          catchProblem((problem) => WeeksApi.workFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

/** A second press while the first is under way is no second entry. */
export const add = createEffect(
  (actions$ = inject(Actions), api = inject(TimeApiClient)) =>
    actions$.pipe(
      ofType(WeeksPage.addSubmitted),
      exhaustMap(({ fields }) =>
        api.add(fields).pipe(
          map((entry) => WeeksApi.saved({ entry })),
          catchProblem((problem) => WeeksApi.saveFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

export const correct = createEffect(
  (actions$ = inject(Actions), api = inject(TimeApiClient)) =>
    actions$.pipe(
      ofType(WeeksPage.correctionSubmitted),
      exhaustMap(({ entry, fields }) =>
        api.correct(entry, fields).pipe(
          map((changed) => WeeksApi.saved({ entry: changed })),
          catchProblem((problem) => WeeksApi.saveFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

/** After a conflict the newer version is read, so that saving again is done knowingly. */
export const reloadAfterConflict = createEffect(
  (actions$ = inject(Actions), api = inject(TimeApiClient)) =>
    actions$.pipe(
      ofType(WeeksPage.correctionSubmitted),
      switchMap(({ entry }) =>
        actions$.pipe(
          ofType(WeeksApi.saveFailed),
          filter(({ problem }) => isStale(problem)),
          switchMap(() =>
            api.entry(entry.id).pipe(
              map((newer) => WeeksApi.entryLoaded({ entry: newer })),
              catchProblem((problem) => WeeksApi.saveFailed({ problem })),
            ),
          ),
        ),
      ),
    ),
  { functional: true },
);

export const voidEntry = createEffect(
  (actions$ = inject(Actions), api = inject(TimeApiClient)) =>
    actions$.pipe(
      ofType(WeeksPage.voidConfirmed),
      concatMap(({ entry, reason }) =>
        api.void(entry, reason).pipe(
          map((voided) => WeeksApi.voided({ entry: voided })),
          catchProblem((problem) => WeeksApi.voidFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

const DONE: Record<string, string> = {
  [WeeksApi.saved.type]: 'Time saved.',
  [WeeksApi.voided.type]: 'Entry voided.',
};

export const say = createEffect(
  (actions$ = inject(Actions), notices = inject(Notices)) =>
    actions$.pipe(
      map(({ type }: Action) => DONE[type]),
      filter((message) => message !== undefined),
      tap((message) => notices.say(message)),
    ),
  { functional: true, dispatch: false },
);

export const sayProblem = createEffect(
  (actions$ = inject(Actions), notices = inject(Notices)) =>
    actions$.pipe(
      ofType(WeeksApi.voidFailed, WeeksApi.workFailed),
      tap(({ problem }) => notices.problem(problem)),
    ),
  { functional: true, dispatch: false },
);
