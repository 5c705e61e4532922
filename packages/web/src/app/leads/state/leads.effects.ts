import { inject } from '@angular/core';
import { Router } from '@angular/router';
import { Actions, createEffect, ofType } from '@ngrx/effects';
import { Store } from '@ngrx/store';
import { concatMap, exhaustMap, filter, map, mergeMap, switchMap, take, tap } from 'rxjs';
import { catchProblem } from '../../platform/api/catch-problem';
import { isStale } from '../../platform/api/problem-kinds';
import { Notices } from '../../platform/page/notices';
import { LeadsApiClient } from '../leads-api';
import { LeadsApi, LeadsPage } from './leads.actions';
import { selectBoardQuestion } from './leads.selectors';

/** The last question wins: an older page that comes late is not shown. */
export const loadList = createEffect(
  (actions$ = inject(Actions), api = inject(LeadsApiClient)) =>
    actions$.pipe(
      ofType(LeadsPage.listOpened),
      switchMap(({ query }) =>
        api.list(query).pipe(
          map((page) => LeadsApi.listLoaded({ page })),
          catchProblem((problem) => LeadsApi.listFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

export const loadBoard = createEffect(
  (actions$ = inject(Actions), api = inject(LeadsApiClient)) =>
    actions$.pipe(
      ofType(LeadsPage.boardOpened),
      switchMap(({ query }) =>
        api.board(query).pipe(
          map((board) => LeadsApi.boardLoaded({ board })),
          catchProblem((problem) => LeadsApi.boardFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

export const loadLead = createEffect(
  (actions$ = inject(Actions), api = inject(LeadsApiClient)) =>
    actions$.pipe(
      ofType(LeadsPage.leadOpened),
      switchMap(({ id }) =>
        api.read(id).pipe(
          map((lead) => LeadsApi.leadLoaded({ lead })),
          catchProblem((problem) => LeadsApi.leadFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

export const loadNotes = createEffect(
  (actions$ = inject(Actions), api = inject(LeadsApiClient)) =>
    actions$.pipe(
      ofType(LeadsPage.leadOpened),
      switchMap(({ id }) =>
        api.notes(id).pipe(
          map(({ rows }) => LeadsApi.notesLoaded({ leadId: id, notes: rows })),
          catchProblem((problem) => LeadsApi.notesFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

/** A second press while the first is under way is no second lead. */
export const create = createEffect(
  (actions$ = inject(Actions), api = inject(LeadsApiClient)) =>
    actions$.pipe(
      ofType(LeadsPage.createSubmitted),
      exhaustMap(({ fields }) =>
        api.create(fields).pipe(
          map((lead) => LeadsApi.created({ lead })),
          catchProblem((problem) => LeadsApi.saveFailed({ form: 'lead', id: null, problem })),
        ),
      ),
    ),
  { functional: true },
);

export const edit = createEffect(
  (actions$ = inject(Actions), api = inject(LeadsApiClient)) =>
    actions$.pipe(
      ofType(LeadsPage.editSubmitted),
      exhaustMap(({ lead: { id, version }, fields }) =>
        api.update({ id, version }, fields).pipe(
          map((lead) => LeadsApi.saved({ form: 'lead', lead })),
          catchProblem((problem) => LeadsApi.saveFailed({ form: 'lead', id, problem })),
        ),
      ),
    ),
  { functional: true },
);

export const setNextStep = createEffect(
  (actions$ = inject(Actions), api = inject(LeadsApiClient)) =>
    actions$.pipe(
      ofType(LeadsPage.nextStepSubmitted),
      exhaustMap(({ lead: { id, version }, fields }) =>
        api.update({ id, version }, fields).pipe(
          map((lead) => LeadsApi.saved({ form: 'next-step', lead })),
          catchProblem((problem) => LeadsApi.saveFailed({ form: 'next-step', id, problem })),
        ),
      ),
    ),
  { functional: true },
);

export const lose = createEffect(
  (actions$ = inject(Actions), api = inject(LeadsApiClient)) =>
    actions$.pipe(
      ofType(LeadsPage.lossSubmitted),
      exhaustMap(({ lead: { id, version }, loss }) =>
        api.lose({ id, version }, loss).pipe(
          map((lead) => LeadsApi.saved({ form: 'loss', lead })),
          catchProblem((problem) => LeadsApi.saveFailed({ form: 'loss', id, problem })),
        ),
      ),
    ),
  { functional: true },
);

export const convert = createEffect(
  (actions$ = inject(Actions), api = inject(LeadsApiClient)) =>
    actions$.pipe(
      ofType(LeadsPage.conversionSubmitted),
      exhaustMap(({ lead: { id, version }, conversion }) =>
        api.convert({ id, version }, conversion).pipe(
          map((lead) => LeadsApi.saved({ form: 'conversion', lead })),
          catchProblem((problem) => LeadsApi.saveFailed({ form: 'conversion', id, problem })),
        ),
      ),
    ),
  { functional: true },
);

export const startEstimate = createEffect(
  (actions$ = inject(Actions), api = inject(LeadsApiClient)) =>
    actions$.pipe(
      ofType(LeadsPage.estimateSubmitted),
      exhaustMap(({ lead: { id, version }, estimate }) =>
        api.startEstimate({ id, version }, estimate).pipe(
          map(({ estimateId }) => LeadsApi.estimateStarted({ estimateId })),
          catchProblem((problem) => LeadsApi.saveFailed({ form: 'estimate', id, problem })),
        ),
      ),
    ),
  { functional: true },
);

export const addNote = createEffect(
  (actions$ = inject(Actions), api = inject(LeadsApiClient)) =>
    actions$.pipe(
      ofType(LeadsPage.noteSubmitted),
      concatMap(({ id, body }) =>
        api.addNote(id, { body }).pipe(
          map((note) => LeadsApi.noteAdded({ leadId: id, note })),
          catchProblem((problem) => LeadsApi.saveFailed({ form: 'note', id, problem })),
        ),
      ),
    ),
  { functional: true },
);

/** Several cards may be on their way at once; one card's next move waits, since it is held while it moves. */
export const changeStage = createEffect(
  (actions$ = inject(Actions), api = inject(LeadsApiClient)) =>
    actions$.pipe(
      ofType(LeadsPage.stagePicked),
      mergeMap(({ lead: { id, version }, stage }) =>
        api.move({ id, version }, stage).pipe(
          map((lead) => LeadsApi.stageChanged({ lead })),
          catchProblem((problem) => LeadsApi.stageRefused({ id, problem })),
        ),
      ),
    ),
  { functional: true },
);

export const win = createEffect(
  (actions$ = inject(Actions), api = inject(LeadsApiClient)) =>
    actions$.pipe(
      ofType(LeadsPage.winConfirmed),
      mergeMap(({ lead: { id, version } }) =>
        api.win({ id, version }).pipe(
          map((lead) => LeadsApi.stageChanged({ lead })),
          catchProblem((problem) => LeadsApi.stageRefused({ id, problem })),
        ),
      ),
    ),
  { functional: true },
);

export const reopen = createEffect(
  (actions$ = inject(Actions), api = inject(LeadsApiClient)) =>
    actions$.pipe(
      ofType(LeadsPage.reopenPressed),
      mergeMap(({ lead: { id, version } }) =>
        api.reopen({ id, version }).pipe(
          map((lead) => LeadsApi.stageChanged({ lead })),
          catchProblem((problem) => LeadsApi.stageRefused({ id, problem })),
        ),
      ),
    ),
  { functional: true },
);

/** After a conflict the newer lead is read, so that a second try starts from it, knowingly. */
export const reloadAfterConflict = createEffect(
  (actions$ = inject(Actions), api = inject(LeadsApiClient)) =>
    actions$.pipe(
      ofType(LeadsApi.saveFailed, LeadsApi.stageRefused),
      filter(({ id, problem }) => id !== null && isStale(problem)),
      mergeMap(({ id }) =>
        api.read(id ?? '').pipe(
          map((lead) => LeadsApi.leadLoaded({ lead })),
          catchProblem((problem) => LeadsApi.leadFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

/** A card that was put where the server does not have it goes back. */
export const reloadBoardAfterRefusal = createEffect(
  (actions$ = inject(Actions), store = inject(Store)) =>
    actions$.pipe(
      ofType(LeadsApi.stageRefused),
      switchMap(() => store.select(selectBoardQuestion).pipe(take(1))),
      filter(({ asked }) => asked),
      map(({ query }) => LeadsPage.boardOpened({ query })),
    ),
  { functional: true },
);

export const openCreated = createEffect(
  (actions$ = inject(Actions), router = inject(Router)) =>
    actions$.pipe(
      ofType(LeadsApi.created),
      tap(({ lead }) => void router.navigate(['/leads', lead.id])),
    ),
  { functional: true, dispatch: false },
);

export const openSaved = createEffect(
  (actions$ = inject(Actions), router = inject(Router)) =>
    actions$.pipe(
      ofType(LeadsApi.saved),
      filter(({ form }) => form === 'lead'),
      tap(({ lead }) => void router.navigate(['/leads', lead.id])),
    ),
  { functional: true, dispatch: false },
);

export const openEstimate = createEffect(
  (actions$ = inject(Actions), router = inject(Router)) =>
    actions$.pipe(
      ofType(LeadsApi.estimateStarted),
      tap(({ estimateId }) => void router.navigate(['/estimates', estimateId])),
    ),
  { functional: true, dispatch: false },
);

const DONE: Record<string, string> = {
  lead: 'Lead saved.',
  'next-step': 'Next step saved.',
  loss: 'Lead lost. It can be reopened.',
  conversion: 'Customer tied to the lead.',
};

export const say = createEffect(
  (actions$ = inject(Actions), notices = inject(Notices)) =>
    actions$.pipe(
      ofType(LeadsApi.created, LeadsApi.saved),
      map((action) => DONE['form' in action ? action.form : 'lead']),
      filter((message) => message !== undefined),
      tap((message) => notices.say(message)),
    ),
  { functional: true, dispatch: false },
);

export const sayProblem = createEffect(
  (actions$ = inject(Actions), notices = inject(Notices)) =>
    actions$.pipe(
      ofType(LeadsApi.stageRefused),
      tap(({ problem }) => notices.problem(problem)),
    ),
  { functional: true, dispatch: false },
);
