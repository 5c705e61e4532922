import { inject, Injector } from '@angular/core';
import { MatDialog } from '@angular/material/dialog';
import { Store } from '@ngrx/store';
import { defer, filter, finalize, map, share, switchMap, tap, type Observable } from 'rxjs';
import type { SessionRenewal } from '../../platform/api/session-renewal';
import { SessionPage } from '../../platform/session/session.actions';

/** One dialog however many requests found the session gone; each of them goes on when it is back. */
export function sessionRenewal(): SessionRenewal {
  const injector = inject(Injector);
  let asking: Observable<void> | null = null;
  return () =>
    (asking ??= defer(() => import('./sign-in-again')).pipe(
      switchMap(({ SignInAgain }) =>
        injector.get(MatDialog).open(SignInAgain, { disableClose: true, width: '440px' }).afterClosed(),
      ),
      filter((signedIn) => signedIn === true),
      tap(() => injector.get(Store).dispatch(SessionPage.signedIn())),
      map(() => undefined),
      finalize(() => (asking = null)),
      share(),
    ));
}
