import { inject } from '@angular/core';
import { Router } from '@angular/router';
import { Actions, createEffect, ofType } from '@ngrx/effects';
import type { Action } from '@ngrx/store';
import { concatMap, exhaustMap, filter, map, switchMap, tap } from 'rxjs';
import { catchProblem } from '../../platform/api/catch-problem';
import { isStale } from '../../platform/api/problem-kinds';
import { Notices } from '../../platform/page/notices';
import { CustomersApiClient } from '../customers-api';
import { CustomersApi, CustomersPage } from './customers.actions';

/** The last question wins: an older page that comes late is not shown. */
export const loadList = createEffect(
  (actions$ = inject(Actions), api = inject(CustomersApiClient)) =>
    actions$.pipe(
      ofType(CustomersPage.listOpened),
      switchMap(({ query }) =>
        api.list(query).pipe(
          map((page) => CustomersApi.listLoaded({ page })),
          catchProblem((problem) => CustomersApi.listFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

export const loadCustomer = createEffect(
  (actions$ = inject(Actions), api = inject(CustomersApiClient)) =>
    actions$.pipe(
      ofType(CustomersPage.customerOpened),
      switchMap(({ id }) =>
        api.read(id).pipe(
          map((customer) => CustomersApi.customerLoaded({ customer })),
          catchProblem((problem) => CustomersApi.customerFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

/** A second press while the first is under way is no second customer. */
export const create = createEffect(
  (actions$ = inject(Actions), api = inject(CustomersApiClient)) =>
    actions$.pipe(
      ofType(CustomersPage.createSubmitted),
      exhaustMap(({ fields }) =>
        api.create(fields).pipe(
          map((customer) => CustomersApi.saved({ customer })),
          catchProblem((problem) => CustomersApi.saveFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

export const edit = createEffect(
  (actions$ = inject(Actions), api = inject(CustomersApiClient)) =>
    actions$.pipe(
      ofType(CustomersPage.editSubmitted),
      exhaustMap(({ id, version, fields }) =>
        api.update(id, version, fields).pipe(
          map((customer) => CustomersApi.saved({ customer })),
          catchProblem((problem) => CustomersApi.saveFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

/** After a conflict the newer version is read, so that the form can tell what changed and save over it knowingly. */
export const reloadAfterConflict = createEffect(
  (actions$ = inject(Actions)) =>
    actions$.pipe(
      ofType(CustomersPage.editSubmitted),
      switchMap(({ id }) =>
        actions$.pipe(
          ofType(CustomersApi.saveFailed),
          filter(({ problem }) => isStale(problem)),
          map(() => CustomersPage.customerOpened({ id })),
        ),
      ),
    ),
  { functional: true },
);

export const openSaved = createEffect(
  (actions$ = inject(Actions), router = inject(Router)) =>
    actions$.pipe(
      ofType(CustomersApi.saved),
      tap(({ customer }) => void router.navigate(['/customers', customer.id])),
    ),
  { functional: true, dispatch: false },
);

export const archive = createEffect(
  (actions$ = inject(Actions), api = inject(CustomersApiClient)) =>
    actions$.pipe(
      ofType(CustomersPage.archiveConfirmed),
      concatMap(({ id }) =>
        api.archive(id).pipe(
          map((customer) => CustomersApi.archived({ customer })),
          catchProblem((problem) => CustomersApi.commandFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

export const restore = createEffect(
  (actions$ = inject(Actions), api = inject(CustomersApiClient)) =>
    actions$.pipe(
      ofType(CustomersPage.restorePressed),
      concatMap(({ id }) =>
        api.restore(id).pipe(
          map((customer) => CustomersApi.restored({ customer })),
          catchProblem((problem) => CustomersApi.commandFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

export const addSite = createEffect(
  (actions$ = inject(Actions), api = inject(CustomersApiClient)) =>
    actions$.pipe(
      ofType(CustomersPage.siteAdded),
      exhaustMap(({ customerId, fields }) =>
        api.addSite(customerId, fields).pipe(
          map((site) => CustomersApi.siteSaved({ site })),
          catchProblem((problem) => CustomersApi.siteSaveFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

export const editSite = createEffect(
  (actions$ = inject(Actions), api = inject(CustomersApiClient)) =>
    actions$.pipe(
      ofType(CustomersPage.siteEdited),
      exhaustMap(({ site, fields }) =>
        api.updateSite(site, fields).pipe(
          map((changed) => CustomersApi.siteSaved({ site: changed })),
          catchProblem((problem) => CustomersApi.siteSaveFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

export const removeSite = createEffect(
  (actions$ = inject(Actions), api = inject(CustomersApiClient)) =>
    actions$.pipe(
      ofType(CustomersPage.siteRemovalConfirmed),
      concatMap(({ site }) =>
        api.removeSite(site).pipe(
          map(() => CustomersApi.siteRemoved({ site })),
          catchProblem((problem) => CustomersApi.commandFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

const DONE: Record<string, string> = {
  [CustomersApi.saved.type]: 'Customer saved.',
  [CustomersApi.archived.type]: 'Customer archived.',
  [CustomersApi.restored.type]: 'Customer back in the list.',
  [CustomersApi.siteSaved.type]: 'Site saved.',
  [CustomersApi.siteRemoved.type]: 'Site removed.',
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
      ofType(CustomersApi.commandFailed),
      tap(({ problem }) => notices.problem(problem)),
    ),
  { functional: true, dispatch: false },
);
