import { Clipboard } from '@angular/cdk/clipboard';
import { inject } from '@angular/core';
import { Router } from '@angular/router';
import type { Invoice } from '@bookmatch/common/invoices/invoices-contract';
import { Actions, createEffect, ofType } from '@ngrx/effects';
import { concat, exhaustMap, filter, map, of, switchMap, tap, type Observable } from 'rxjs';
import { catchProblem } from '../../platform/api/catch-problem';
import { isStale } from '../../platform/api/problem-kinds';
import { NavCounts } from '../../platform/page/nav-counts';
import { Notices } from '../../platform/page/notices';
import { InvoicesApiClient } from '../invoices-api';
import { InvoicesApi, InvoicesPage } from './invoices.actions';

/** The last question wins: an older page that comes late is not shown. */
export const loadList = createEffect(
  (actions$ = inject(Actions), api = inject(InvoicesApiClient)) =>
    actions$.pipe(
      ofType(InvoicesPage.listOpened),
      switchMap(({ query }) =>
        api.list(query).pipe(
          map((page) => InvoicesApi.listLoaded({ page })),
          catchProblem((problem) => InvoicesApi.listFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

export const loadTotals = createEffect(
  (actions$ = inject(Actions), api = inject(InvoicesApiClient)) =>
    actions$.pipe(
      ofType(InvoicesPage.totalsWanted),
      switchMap(() =>
        api.totals().pipe(
          map((totals) => InvoicesApi.totalsLoaded({ totals })),
          catchProblem(() => InvoicesApi.totalsFailed()),
        ),
      ),
    ),
  { functional: true },
);

/** What waits for somebody: invoices that are late. */
export const countOverdue = createEffect(
  (actions$ = inject(Actions), counts = inject(NavCounts)) =>
    actions$.pipe(
      ofType(InvoicesApi.totalsLoaded),
      tap(({ totals }) => counts.set('invoices', totals.overdueCount)),
    ),
  { functional: true, dispatch: false },
);

export const loadAging = createEffect(
  (actions$ = inject(Actions), api = inject(InvoicesApiClient)) =>
    actions$.pipe(
      ofType(InvoicesPage.agingOpened),
      switchMap(({ query }) =>
        api.aging(query).pipe(
          map((aging) => InvoicesApi.agingLoaded({ aging })),
          catchProblem((problem) => InvoicesApi.agingFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

export const loadPayments = createEffect(
  (actions$ = inject(Actions), api = inject(InvoicesApiClient)) =>
    actions$.pipe(
      ofType(InvoicesPage.paymentsOpened),
      switchMap(({ query }) =>
        api.payments(query).pipe(
          map((page) => InvoicesApi.paymentsLoaded({ page })),
          catchProblem((problem) => InvoicesApi.paymentsFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

export const loadInvoice = createEffect(
  (actions$ = inject(Actions), api = inject(InvoicesApiClient)) =>
    actions$.pipe(
      ofType(InvoicesPage.invoiceOpened),
      switchMap(({ id }) =>
        api.read(id).pipe(
          map((invoice) => InvoicesApi.invoiceLoaded({ invoice })),
          catchProblem((problem) => InvoicesApi.invoiceFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

/** A second press while the first is under way is no second invoice. */
export const create = createEffect(
  (actions$ = inject(Actions), api = inject(InvoicesApiClient)) =>
    actions$.pipe(
      ofType(InvoicesPage.createSubmitted),
      exhaustMap(({ fields }) =>
        api.create(fields).pipe(
          map((invoice) => InvoicesApi.created({ invoice })),
          catchProblem((problem) => InvoicesApi.saveFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

export const edit = createEffect(
  (actions$ = inject(Actions), api = inject(InvoicesApiClient)) =>
    actions$.pipe(
      ofType(InvoicesPage.editSubmitted),
      exhaustMap(({ invoice, fields }) =>
        api.update(invoice, fields).pipe(
          map((changed) => InvoicesApi.edited({ invoice: changed })),
          catchProblem((problem) => InvoicesApi.saveFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

export const openSaved = createEffect(
  (actions$ = inject(Actions), router = inject(Router)) =>
    actions$.pipe(
      ofType(InvoicesApi.created, InvoicesApi.edited),
      tap(({ invoice }) => void router.navigate(['/invoices', invoice.id])),
    ),
  { functional: true, dispatch: false },
);

export const remove = createEffect(
  (actions$ = inject(Actions), api = inject(InvoicesApiClient)) =>
    actions$.pipe(
      ofType(InvoicesPage.deletionConfirmed),
      exhaustMap(({ invoice }) =>
        api.remove(invoice).pipe(
          map(() => InvoicesApi.removed({ id: invoice.id })),
          catchProblem((problem) => InvoicesApi.commandFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

export const leaveRemoved = createEffect(
  (actions$ = inject(Actions), router = inject(Router), notices = inject(Notices)) =>
    actions$.pipe(
      ofType(InvoicesApi.removed),
      tap(() => {
        notices.say('Draft deleted.');
        void router.navigate(['/invoices']);
      }),
    ),
  { functional: true, dispatch: false },
);

/** The end of every command of a dialog: the invoice as it stands now, and a word about it. */
const answered = (message: string) => (answer: Observable<Invoice>) =>
  answer.pipe(
    map((invoice) => InvoicesApi.done({ invoice, message })),
    catchProblem((problem) => InvoicesApi.saveFailed({ problem })),
  );

export const issue = createEffect(
  (actions$ = inject(Actions), api = inject(InvoicesApiClient)) =>
    actions$.pipe(
      ofType(InvoicesPage.issueSubmitted),
      exhaustMap(({ invoice }) => api.issue(invoice).pipe(answered('Invoice issued.'))),
    ),
  { functional: true },
);

/** When the letter is refused after the invoice was issued, the dialog stays open with the letter alone. */
export const issueAndSend = createEffect(
  (actions$ = inject(Actions), api = inject(InvoicesApiClient)) =>
    actions$.pipe(
      ofType(InvoicesPage.issueAndSendSubmitted),
      exhaustMap(({ invoice, letter }) =>
        api.issue(invoice).pipe(
          switchMap((issued) =>
            concat(
              of(InvoicesApi.issuedFirst({ invoice: issued })),
              api.send(issued, letter).pipe(answered('Invoice issued and sent.')),
            ),
          ),
          catchProblem((problem) => InvoicesApi.saveFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

export const send = createEffect(
  (actions$ = inject(Actions), api = inject(InvoicesApiClient)) =>
    actions$.pipe(
      ofType(InvoicesPage.sendSubmitted),
      exhaustMap(({ invoice, letter }) => api.send(invoice, letter).pipe(answered('Invoice sent.'))),
    ),
  { functional: true },
);

export const recordPayment = createEffect(
  (actions$ = inject(Actions), api = inject(InvoicesApiClient)) =>
    actions$.pipe(
      ofType(InvoicesPage.paymentSubmitted),
      exhaustMap(({ invoice, payment }) =>
        api.recordPayment(invoice, payment).pipe(answered('Payment recorded.')),
      ),
    ),
  { functional: true },
);

export const refund = createEffect(
  (actions$ = inject(Actions), api = inject(InvoicesApiClient)) =>
    actions$.pipe(
      ofType(InvoicesPage.refundSubmitted),
      exhaustMap(({ invoice, refund: given }) =>
        api.refund(invoice, given).pipe(answered('Refund recorded.')),
      ),
    ),
  { functional: true },
);

export const credit = createEffect(
  (actions$ = inject(Actions), api = inject(InvoicesApiClient)) =>
    actions$.pipe(
      ofType(InvoicesPage.creditSubmitted),
      exhaustMap(({ invoice, credit: given }) =>
        api.credit(invoice, given).pipe(answered('Credit note issued.')),
      ),
    ),
  { functional: true },
);

export const reverse = createEffect(
  (actions$ = inject(Actions), api = inject(InvoicesApiClient)) =>
    actions$.pipe(
      ofType(InvoicesPage.reversalConfirmed),
      exhaustMap(({ paymentId, reason }) =>
        api.reversePayment(paymentId, reason).pipe(
          map((invoice) => InvoicesApi.done({ invoice, message: 'Payment taken back.' })),
          catchProblem((problem) => InvoicesApi.commandFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

export const sendLetter = createEffect(
  (actions$ = inject(Actions), api = inject(InvoicesApiClient)) =>
    actions$.pipe(
      ofType(InvoicesPage.letterSubmitted),
      exhaustMap(({ invoiceId, subject, to }) =>
        api.sendDocument(subject, to).pipe(
          map(() => InvoicesApi.letterSent({ invoiceId })),
          catchProblem((problem) => InvoicesApi.saveFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

/** The history on the screen shows the letter too. */
export const reloadAfterLetter = createEffect(
  (actions$ = inject(Actions)) =>
    actions$.pipe(
      ofType(InvoicesApi.letterSent),
      map(({ invoiceId }) => InvoicesPage.invoiceOpened({ id: invoiceId })),
    ),
  { functional: true },
);

/** Somebody was quicker: what stands now is read, and the person decides again. */
export const reloadAfterConflict = createEffect(
  (actions$ = inject(Actions)) =>
    actions$.pipe(
      ofType(
        InvoicesPage.editSubmitted,
        InvoicesPage.deletionConfirmed,
        InvoicesPage.issueSubmitted,
        InvoicesPage.issueAndSendSubmitted,
        InvoicesPage.sendSubmitted,
        InvoicesPage.paymentSubmitted,
        InvoicesPage.refundSubmitted,
        InvoicesPage.creditSubmitted,
      ),
      switchMap(({ invoice }) =>
        actions$.pipe(
          ofType(InvoicesApi.saveFailed, InvoicesApi.commandFailed),
          filter(({ problem }) => isStale(problem)),
          map(() => InvoicesPage.invoiceOpened({ id: invoice.id })),
        ),
      ),
    ),
  { functional: true },
);

export const makeLink = createEffect(
  (actions$ = inject(Actions), api = inject(InvoicesApiClient)) =>
    actions$.pipe(
      ofType(InvoicesPage.linkWanted),
      exhaustMap(({ invoiceId }) =>
        api.createLink(invoiceId).pipe(
          map(({ url }) => InvoicesApi.linkMade({ url })),
          catchProblem((problem) => InvoicesApi.commandFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

export const copyLink = createEffect(
  (actions$ = inject(Actions), clipboard = inject(Clipboard), notices = inject(Notices)) =>
    actions$.pipe(
      ofType(InvoicesApi.linkMade),
      tap(({ url }) => notices.say(clipboard.copy(url) ? 'Link copied.' : `The link is ${url}`)),
    ),
  { functional: true, dispatch: false },
);

export const say = createEffect(
  (actions$ = inject(Actions), notices = inject(Notices)) =>
    actions$.pipe(
      ofType(InvoicesApi.done, InvoicesApi.letterSent, InvoicesApi.created, InvoicesApi.edited),
      tap((action) => notices.say('message' in action ? action.message : SAID[action.type])),
    ),
  { functional: true, dispatch: false },
);
const SAID = {
  [InvoicesApi.letterSent.type]: 'Letter sent.',
  [InvoicesApi.created.type]: 'Draft saved.',
  [InvoicesApi.edited.type]: 'Draft saved.',
};

export const sayProblem = createEffect(
  (actions$ = inject(Actions), notices = inject(Notices)) =>
    actions$.pipe(
      ofType(InvoicesApi.commandFailed),
      tap(({ problem }) => notices.problem(problem)),
    ),
  { functional: true, dispatch: false },
);
