import { inject } from '@angular/core';
import { Actions, createEffect, ofType } from '@ngrx/effects';
import { concat, exhaustMap, filter, map, of, switchMap, takeWhile, tap, timer } from 'rxjs';
import { catchProblem } from '../../platform/api/catch-problem';
import { PageLoad } from '../../platform/session/page-load';
import { InvoicePageApi } from '../invoice-page-api';
import { InvoicePage, InvoicePageServer } from './invoice-page.actions';

const CHECK_EVERY_MS = 3000;
const MOST_CHECKS = 10;

export const startPayment = createEffect(
  (actions$ = inject(Actions), api = inject(InvoicePageApi)) =>
    actions$.pipe(
      ofType(InvoicePage.payPressed),
      exhaustMap(({ token }) =>
        api.startCardPayment(token).pipe(
          map(({ url }) => InvoicePageServer.paymentPageReady({ url })),
          catchProblem((problem) => InvoicePageServer.paymentRefused({ problem })),
        ),
      ),
    ),
  { functional: true },
);

export const goToPaymentPage = createEffect(
  (actions$ = inject(Actions), page = inject(PageLoad)) =>
    actions$.pipe(
      ofType(InvoicePageServer.paymentPageReady),
      tap(({ url }) => page.go(url)),
    ),
  { functional: true, dispatch: false },
);

/** Back from the provider's page: asks until the shop has heard of the payment, for half a minute at most. */
export const confirmPayment = createEffect(
  (actions$ = inject(Actions), api = inject(InvoicePageApi)) =>
    actions$.pipe(
      ofType(InvoicePage.opened, InvoicePage.checkPressed),
      filter(
        (action) => !('invoice' in action) || (action.arrival === 'paid' && action.invoice.balanceCents > 0),
      ),
      switchMap(({ token }) =>
        concat(
          timer(0, CHECK_EVERY_MS).pipe(
            takeWhile((tries) => tries < MOST_CHECKS),
            exhaustMap(() =>
              api.checkCardPayment(token).pipe(
                map((invoice) => InvoicePageServer.checked({ invoice })),
                catchProblem(() => InvoicePageServer.checkFailed()),
              ),
            ),
          ),
          of(InvoicePageServer.checkingGivenUp()),
        ).pipe(
          // The answer that says paid is the last; nothing is given up then.
          takeWhile((action) => !('invoice' in action) || action.invoice.balanceCents > 0, true),
        ),
      ),
    ),
  { functional: true },
);
