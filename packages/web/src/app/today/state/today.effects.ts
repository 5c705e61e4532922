import { inject } from '@angular/core';
import type { Today } from '@bookmatch/common/today/today-contract';
import type { NavCounts as Counts } from '@bookmatch/common/today/nav-counts-contract';
import { Actions, createEffect, ofType } from '@ngrx/effects';
import { map, switchMap, tap } from 'rxjs';
import { catchProblem } from '../../platform/api/catch-problem';
import { NavCounts } from '../../platform/page/nav-counts';
import { setNavCounts } from '../keep-nav-counts';
import { TodayApiClient } from '../today-api';
import { TodayApi, TodayPage } from './today.actions';

export const loadToday = createEffect(
  (actions$ = inject(Actions), api = inject(TodayApiClient)) =>
    actions$.pipe(
      ofType(TodayPage.opened),
      switchMap(() =>
        api.read().pipe(
          map((page) => TodayApi.loaded({ page })),
          catchProblem((problem) => TodayApi.failed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

/** The navigation says what the page says. */
export const countAlike = createEffect(
  (actions$ = inject(Actions), counts = inject(NavCounts)) =>
    actions$.pipe(
      ofType(TodayApi.loaded),
      tap(({ page }) => setNavCounts(counts, countsOf(page))),
    ),
  { functional: true, dispatch: false },
);

function countsOf(page: Today): Counts {
  if (page.role === 'owner')
    return { leads: page.leadsToFollowUp.count, invoices: page.overdueInvoices.count };
  return page.role === 'bookkeeper' ? { invoices: page.overdueInvoices.count } : {};
}
