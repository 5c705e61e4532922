import { inject } from '@angular/core';
import { Actions, createEffect, ofType } from '@ngrx/effects';
import { exhaustMap, map, switchMap, tap } from 'rxjs';
import { catchProblem } from '../../platform/api/catch-problem';
import { PageLoad } from '../../platform/session/page-load';
import { SessionPage } from '../../platform/session/session.actions';
import { SubscriptionApiClient } from '../subscription-api';
import { SubscriptionApi, SubscriptionPage } from './subscription.actions';

export const load = createEffect(
  (actions$ = inject(Actions), api = inject(SubscriptionApiClient)) =>
    actions$.pipe(
      ofType(SubscriptionPage.opened),
      switchMap(() =>
        api.read().pipe(
          map((subscription) => SubscriptionApi.loaded({ subscription })),
          catchProblem((problem) => SubscriptionApi.loadFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

/** The page of the provider may be left before its word has reached the server: it is asked. */
export const refresh = createEffect(
  (actions$ = inject(Actions), api = inject(SubscriptionApiClient)) =>
    actions$.pipe(
      ofType(SubscriptionPage.returnedFromProvider),
      switchMap(() =>
        api.refresh().pipe(
          map((subscription) => SubscriptionApi.refreshed({ subscription })),
          catchProblem((problem) => SubscriptionApi.loadFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

/** What the whole frame shows of the subscription may have changed. */
export const renewSession = createEffect(
  (actions$ = inject(Actions)) =>
    actions$.pipe(
      ofType(SubscriptionApi.refreshed),
      map(() => SessionPage.shopChanged()),
    ),
  { functional: true },
);

export const subscribe = createEffect(
  (actions$ = inject(Actions), api = inject(SubscriptionApiClient)) =>
    actions$.pipe(
      ofType(SubscriptionPage.subscribePressed),
      exhaustMap(() =>
        api.startCheckout().pipe(
          map(({ url }) => SubscriptionApi.providerPageReady({ url })),
          catchProblem((problem) => SubscriptionApi.providerPageFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

export const manage = createEffect(
  (actions$ = inject(Actions), api = inject(SubscriptionApiClient)) =>
    actions$.pipe(
      ofType(SubscriptionPage.managePressed),
      exhaustMap(() =>
        api.openPortal().pipe(
          map(({ url }) => SubscriptionApi.providerPageReady({ url })),
          catchProblem((problem) => SubscriptionApi.providerPageFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

export const goToProvider = createEffect(
  (actions$ = inject(Actions), page = inject(PageLoad)) =>
    actions$.pipe(
      ofType(SubscriptionApi.providerPageReady),
      tap(({ url }) => page.go(url)),
    ),
  { functional: true, dispatch: false },
);
