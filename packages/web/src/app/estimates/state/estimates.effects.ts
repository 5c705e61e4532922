import { inject } from '@angular/core';
import { Router } from '@angular/router';
import { Actions, createEffect, ofType } from '@ngrx/effects';
import { Store, type Action } from '@ngrx/store';
import { concatMap, exhaustMap, filter, map, switchMap, take, tap } from 'rxjs';
import { catchProblem } from '../../platform/api/catch-problem';
import { isStale } from '../../platform/api/problem-kinds';
import { Notices } from '../../platform/page/notices';
import { EstimatesApiClient } from '../estimates-api';
import { EstimatesApi, EstimatesPage } from './estimates.actions';
import { selectEstimate } from './estimates.selectors';

/** The last question wins: an older page that comes late is not shown. */
export const loadList = createEffect(
  (actions$ = inject(Actions), api = inject(EstimatesApiClient)) =>
    actions$.pipe(
      ofType(EstimatesPage.listOpened),
      switchMap(({ query }) =>
        api.list(query).pipe(
          map((page) => EstimatesApi.listLoaded({ page })),
          catchProblem((problem) => EstimatesApi.listFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

export const loadEstimate = createEffect(
  (actions$ = inject(Actions), api = inject(EstimatesApiClient)) =>
    actions$.pipe(
      ofType(EstimatesPage.estimateOpened, EstimatesPage.revisionOpened),
      map((action) => ('revision' in action ? action.revision.estimateId : action.id)),
      switchMap((id) =>
        api.read(id).pipe(
          map((estimate) => EstimatesApi.estimateLoaded({ estimate })),
          catchProblem((problem) => EstimatesApi.estimateFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

export const loadOperations = createEffect(
  (actions$ = inject(Actions), api = inject(EstimatesApiClient)) =>
    actions$.pipe(
      ofType(EstimatesPage.estimateOpened),
      exhaustMap(() =>
        api.operations().pipe(
          map(({ rows }) => EstimatesApi.operationsLoaded({ operations: rows })),
          catchProblem((problem) => EstimatesApi.commandFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

export const loadRevision = createEffect(
  (actions$ = inject(Actions), api = inject(EstimatesApiClient)) =>
    actions$.pipe(
      ofType(EstimatesPage.revisionOpened),
      switchMap(({ revision }) =>
        api.readRevision(revision).pipe(
          map((loaded) => EstimatesApi.revisionLoaded({ revision: loaded })),
          catchProblem((problem) => EstimatesApi.commandFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

/** A second press while the first is under way is no second estimate. */
export const create = createEffect(
  (actions$ = inject(Actions), api = inject(EstimatesApiClient)) =>
    actions$.pipe(
      ofType(EstimatesPage.createSubmitted),
      exhaustMap(({ fields }) =>
        api.create(fields).pipe(
          map((estimate) => EstimatesApi.created({ estimate })),
          catchProblem((problem) => EstimatesApi.createFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

export const duplicate = createEffect(
  (actions$ = inject(Actions), api = inject(EstimatesApiClient)) =>
    actions$.pipe(
      ofType(EstimatesPage.duplicatePressed),
      exhaustMap(({ id }) =>
        api.duplicate(id).pipe(
          map((estimate) => EstimatesApi.created({ estimate })),
          catchProblem((problem) => EstimatesApi.commandFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

export const openCreated = createEffect(
  (actions$ = inject(Actions), router = inject(Router)) =>
    actions$.pipe(
      ofType(EstimatesApi.created),
      tap(({ estimate }) => void router.navigate(['/estimates', estimate.id])),
    ),
  { functional: true, dispatch: false },
);

/**
 * One save after the other, each with the version that the one before it brought, so that quick typing never
 * conflicts with itself.
 */
export const saveDraft = createEffect(
  (actions$ = inject(Actions), api = inject(EstimatesApiClient), store = inject(Store)) =>
    actions$.pipe(
      ofType(EstimatesPage.draftEdited),
      concatMap(({ draft, content }) =>
        store.select(selectEstimate(draft.estimateId)).pipe(
          take(1),
          filter((estimate) => estimate !== null),
          switchMap(({ currentRevision }) => api.saveRevision(draft, currentRevision.version, content)),
          map((revision) => EstimatesApi.draftSaved({ draft, revision })),
          catchProblem((problem) => EstimatesApi.draftFailed({ draft, problem })),
        ),
      ),
    ),
  { functional: true },
);

/** After a conflict the newer version is read, so that the editor can say what changed and save over it knowingly. */
export const reloadAfterConflict = createEffect(
  (actions$ = inject(Actions)) =>
    actions$.pipe(
      ofType(EstimatesApi.draftFailed),
      filter(({ problem }) => isStale(problem)),
      map(({ draft }) => EstimatesPage.estimateOpened({ id: draft.estimateId })),
    ),
  { functional: true },
);

/** A revision that was sent under the typing hands is frozen: what was typed becomes the next one. */
export const rescue = createEffect(
  (actions$ = inject(Actions), api = inject(EstimatesApiClient)) =>
    actions$.pipe(
      ofType(EstimatesPage.rescuePressed),
      exhaustMap(({ estimateId, content }) =>
        api.read(estimateId).pipe(
          switchMap((estimate) => api.createRevision(estimate)),
          switchMap(({ currentRevision: { id: revisionId, version } }) =>
            api.saveRevision({ estimateId, revisionId }, version, content),
          ),
          switchMap(() => api.read(estimateId)),
          map((estimate) => EstimatesApi.revisionStarted({ estimate })),
          catchProblem((problem) => EstimatesApi.commandFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

export const editHead = createEffect(
  (actions$ = inject(Actions), api = inject(EstimatesApiClient)) =>
    actions$.pipe(
      ofType(EstimatesPage.headEdited),
      concatMap(({ estimate, fields }) =>
        api.update(estimate, fields).pipe(
          map((changed) => EstimatesApi.headSaved({ estimate: changed })),
          catchProblem((problem) => EstimatesApi.commandFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

/** Sends what is on the screen: the versions that were read last. */
export const send = createEffect(
  (actions$ = inject(Actions), api = inject(EstimatesApiClient), store = inject(Store)) =>
    actions$.pipe(
      ofType(EstimatesPage.sendSubmitted),
      exhaustMap(({ estimateId, to, message }) =>
        store.select(selectEstimate(estimateId)).pipe(
          take(1),
          filter((estimate) => estimate !== null),
          switchMap((estimate) =>
            api.send(estimate, { to, message, revisionVersion: estimate.currentRevision.version }),
          ),
          map((estimate) => EstimatesApi.sent({ estimate })),
          catchProblem((problem) => EstimatesApi.sendFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

export const startRevision = createEffect(
  (actions$ = inject(Actions), api = inject(EstimatesApiClient)) =>
    actions$.pipe(
      ofType(EstimatesPage.newRevisionPressed),
      exhaustMap(({ estimate }) =>
        api.createRevision(estimate).pipe(
          map((changed) => EstimatesApi.revisionStarted({ estimate: changed })),
          catchProblem((problem) => EstimatesApi.commandFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

export const decline = createEffect(
  (actions$ = inject(Actions), api = inject(EstimatesApiClient)) =>
    actions$.pipe(
      ofType(EstimatesPage.declineConfirmed),
      exhaustMap(({ estimate, reason }) =>
        api.decline(estimate, reason).pipe(
          map((changed) => EstimatesApi.declined({ estimate: changed })),
          catchProblem((problem) => EstimatesApi.commandFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

export const answer = createEffect(
  (actions$ = inject(Actions), api = inject(EstimatesApiClient)) =>
    actions$.pipe(
      ofType(EstimatesPage.answerSubmitted),
      concatMap(({ estimateId, questionId, body }) =>
        api.answer(estimateId, questionId, body).pipe(
          map((question) => EstimatesApi.answered({ estimateId, question })),
          catchProblem((problem) => EstimatesApi.commandFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

/** Sending makes a link too, so the list is read again after it. */
export const loadLinks = createEffect(
  (actions$ = inject(Actions), api = inject(EstimatesApiClient)) =>
    actions$.pipe(
      ofType(EstimatesPage.linksOpened, EstimatesApi.sent),
      map((action) => ('estimateId' in action ? action.estimateId : action.estimate.id)),
      switchMap((estimateId) =>
        api.links(estimateId).pipe(
          map(({ rows }) => EstimatesApi.linksLoaded({ links: rows })),
          catchProblem((problem) => EstimatesApi.commandFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

export const makeLink = createEffect(
  (actions$ = inject(Actions), api = inject(EstimatesApiClient)) =>
    actions$.pipe(
      ofType(EstimatesPage.linkAsked),
      exhaustMap(({ estimateId }) =>
        api.createLink(estimateId).pipe(
          map((link) => EstimatesApi.linkMade({ link })),
          catchProblem((problem) => EstimatesApi.commandFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

export const revokeLink = createEffect(
  (actions$ = inject(Actions), api = inject(EstimatesApiClient)) =>
    actions$.pipe(
      ofType(EstimatesPage.linkRevoked),
      concatMap(({ id }) =>
        api.revokeLink(id).pipe(
          map((link) => EstimatesApi.linkEnded({ link })),
          catchProblem((problem) => EstimatesApi.commandFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

const DONE: Record<string, string> = {
  [EstimatesApi.sent.type]: 'Estimate sent.',
  [EstimatesApi.revisionStarted.type]:
    'New revision started. The customer keeps the sent one until you send this.',
  [EstimatesApi.declined.type]: 'Marked as declined.',
  [EstimatesApi.answered.type]: 'Answer sent to the customer.',
  [EstimatesApi.linkEnded.type]: 'The link no longer works.',
  [EstimatesApi.headSaved.type]: 'Saved.',
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
      ofType(EstimatesApi.commandFailed),
      tap(({ problem }) => notices.problem(problem)),
    ),
  { functional: true, dispatch: false },
);
