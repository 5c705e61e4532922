import { DOCUMENT, inject } from '@angular/core';
import { Actions, createEffect, ofType } from '@ngrx/effects';
import { Store, type Action } from '@ngrx/store';
import {
  concatMap,
  distinctUntilChanged,
  EMPTY,
  exhaustMap,
  filter,
  from,
  fromEvent,
  interval,
  map,
  merge,
  of,
  switchMap,
  takeUntil,
} from 'rxjs';
import { catchProblem } from '../../platform/api/catch-problem';
import { PunchSender, type Sent } from '../punches/punch-sender';
import { PunchStore } from '../punches/punch-store';
import { letGo, movedTo, putOn } from '../punches/settle-punches';
import { TimeApiClient } from '../time-api';
import { ClockApi, ClockPage, PunchQueue } from './clock.actions';
import { clockFeature } from './clock.state';

const RETRY_MS = 20_000;

/** An answer that was asked for before a punch was taken is older than what the punch answered. */
export const loadClock = createEffect(
  (actions$ = inject(Actions), api = inject(TimeApiClient)) =>
    actions$.pipe(
      ofType(ClockPage.opened, ClockPage.woken),
      switchMap(() =>
        api.clock().pipe(
          map((clock) => ClockApi.loaded({ clock })),
          catchProblem((problem) => ClockApi.loadFailed({ problem })),
          takeUntil(actions$.pipe(ofType(ClockApi.punchTaken))),
        ),
      ),
    ),
  { functional: true },
);

export const loadJobs = createEffect(
  (actions$ = inject(Actions), api = inject(TimeApiClient)) =>
    actions$.pipe(
      ofType(ClockPage.jobsWanted),
      exhaustMap(() =>
        api.clockJobs().pipe(
          map((jobs) => ClockApi.jobsLoaded({ jobs })),
          catchProblem((problem) => ClockApi.jobsFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

/** Writes a punch down on the device before anything else: from here on it cannot be lost. */
export const keep = createEffect(
  (actions$ = inject(Actions), store = inject(PunchStore)) =>
    actions$.pipe(
      ofType(ClockPage.punched),
      concatMap(({ punch }) => store.change((punches) => [...punches, punch])),
      map((punches) => PunchQueue.changed({ punches })),
    ),
  { functional: true },
);

export const readQueue = createEffect(
  (actions$ = inject(Actions), store = inject(PunchStore)) =>
    merge(actions$.pipe(ofType(ClockPage.opened)), store.changedElsewhere$).pipe(
      concatMap(() => store.read()),
      map((punches) => PunchQueue.changed({ punches })),
    ),
  { functional: true },
);

export const settle = createEffect(
  (actions$ = inject(Actions), store = inject(PunchStore)) =>
    merge(
      actions$.pipe(
        ofType(ClockPage.refusedPutOn),
        map(({ order, work }) => putOn(order, work)),
      ),
      actions$.pipe(
        ofType(ClockPage.refusedMoved),
        map(({ order, at }) => movedTo(order, at)),
      ),
      actions$.pipe(
        ofType(ClockPage.refusedLetGo),
        map(({ order }) => letGo(order)),
      ),
    ).pipe(
      concatMap((change) => store.change(change)),
      map((punches) => PunchQueue.changed({ punches })),
    ),
  { functional: true },
);

/** Sends the first punch that waits. A taken one changes the queue, which sends the next. */
export const send = createEffect(
  (actions$ = inject(Actions), sender = inject(PunchSender)) =>
    actions$.pipe(
      ofType(PunchQueue.changed, ClockApi.punchTaken, PunchQueue.retryDue, ClockPage.sendPressed),
      filter((action) => !('punches' in action) || action.punches.length > 0),
      concatMap(({ type }) => sender.next(type === ClockPage.sendPressed.type)),
      concatMap(actionsOf),
    ),
  { functional: true },
);

function actionsOf(sent: Sent) {
  switch (sent.type) {
    case 'taken':
      return of<Action>(ClockApi.punchTaken(sent));
    case 'refused':
      // What the clock shows may be what the refusal is about.
      return from<Action[]>([PunchQueue.changed(sent), ClockPage.woken()]);
    case 'waits':
      return of<Action>(PunchQueue.waits(sent));
    case 'nothing':
      return EMPTY;
  }
}

export const retry = createEffect(
  (state = inject(Store)) =>
    state.select(clockFeature.selectTrying).pipe(
      distinctUntilChanged(),
      switchMap((trying) => (trying ? interval(RETRY_MS) : EMPTY)),
      map(() => PunchQueue.retryDue()),
    ),
  { functional: true },
);

/** A phone that was in a pocket, or a network that came back. */
export const wake = createEffect(
  (document = inject(DOCUMENT)) => {
    const window = document.defaultView;
    const online$ = window ? fromEvent(window, 'online') : EMPTY;
    const seen$ = fromEvent(document, 'visibilitychange').pipe(
      filter(() => document.visibilityState === 'visible'),
    );
    return merge(online$, seen$).pipe(
      concatMap(() => from<Action[]>([PunchQueue.retryDue(), ClockPage.woken()])),
    );
  },
  { functional: true },
);
