import { inject } from '@angular/core';
import { Actions, createEffect, ofType } from '@ngrx/effects';
import { exhaustMap, filter, map, switchMap, tap } from 'rxjs';
import { catchProblem } from '../../platform/api/catch-problem';
import { isStale } from '../../platform/api/problem-kinds';
import { Notices } from '../../platform/page/notices';
import { PageLoad } from '../../platform/session/page-load';
import { SessionPage } from '../../platform/session/session.actions';
import { ShopsApiClient } from '../shops-api';
import { SettingsApi, SettingsPage } from './settings.actions';

export const loadSettings = createEffect(
  (actions$ = inject(Actions), api = inject(ShopsApiClient)) =>
    actions$.pipe(
      ofType(SettingsPage.opened),
      switchMap(() =>
        api.readSettings().pipe(
          map((shop) => SettingsApi.loaded({ shop })),
          catchProblem((problem) => SettingsApi.loadFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

export const saveSettings = createEffect(
  (actions$ = inject(Actions), api = inject(ShopsApiClient)) =>
    actions$.pipe(
      ofType(SettingsPage.saveSubmitted),
      exhaustMap(({ version, fields }) =>
        api.changeSettings(version, fields).pipe(
          map((shop) => SettingsApi.saved({ shop })),
          catchProblem((problem) => SettingsApi.saveFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

/** After a conflict the newer version is read, so that the form can tell what changed and save over it knowingly. */
export const reloadSettingsAfterConflict = createEffect(
  (actions$ = inject(Actions), api = inject(ShopsApiClient)) =>
    actions$.pipe(
      ofType(SettingsApi.saveFailed),
      filter(({ problem }) => isStale(problem)),
      switchMap(() =>
        api.readSettings().pipe(
          map((shop) => SettingsApi.loaded({ shop })),
          catchProblem((problem) => SettingsApi.loadFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

/** The frame shows the shop's name, and every time and length follows its zone and units. */
export const renewSession = createEffect(
  (actions$ = inject(Actions)) =>
    actions$.pipe(
      ofType(SettingsApi.saved),
      map(() => SessionPage.shopChanged()),
    ),
  { functional: true },
);

/** The page of the provider may be left before its word has reached the server: it is asked. */
export const refreshCardPayments = createEffect(
  (actions$ = inject(Actions), api = inject(ShopsApiClient)) =>
    actions$.pipe(
      ofType(SettingsPage.returnedFromProvider),
      switchMap(() =>
        api.refreshCardPayments().pipe(
          map((shop) => SettingsApi.loaded({ shop })),
          catchProblem((problem) => SettingsApi.loadFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

export const openCardPayments = createEffect(
  (actions$ = inject(Actions), api = inject(ShopsApiClient)) =>
    actions$.pipe(
      ofType(SettingsPage.cardPaymentsPressed),
      exhaustMap(() =>
        api.setUpCardPayments().pipe(
          map(({ url }) => SettingsApi.providerPageReady({ url })),
          catchProblem((problem) => SettingsApi.cardPaymentsFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

export const goToProvider = createEffect(
  (actions$ = inject(Actions), page = inject(PageLoad)) =>
    actions$.pipe(
      ofType(SettingsApi.providerPageReady),
      tap(({ url }) => page.go(url)),
    ),
  { functional: true, dispatch: false },
);

export const saySettingsSaved = createEffect(
  (actions$ = inject(Actions), notices = inject(Notices)) =>
    actions$.pipe(
      ofType(SettingsApi.saved),
      tap(() => notices.say('Settings saved.')),
    ),
  { functional: true, dispatch: false },
);
