import { inject } from '@angular/core';
import { Router } from '@angular/router';
import type { Problem } from '@bookmatch/common/problems/problem';
import { Actions, createEffect, ofType } from '@ngrx/effects';
import type { Action } from '@ngrx/store';
import { concatMap, exhaustMap, filter, map, merge, switchMap, tap } from 'rxjs';
import { catchProblem } from '../../platform/api/catch-problem';
import { fieldProblems, isStale } from '../../platform/api/problem-kinds';
import { Notices } from '../../platform/page/notices';
import { Confirm } from '../../ui/confirm/confirm';
import { JobsApiClient } from '../jobs-api';
import { JobsApi, JobsPage } from './jobs.actions';

/** The last question wins: an older page that comes late is not shown. */
export const loadList = createEffect(
  (actions$ = inject(Actions), api = inject(JobsApiClient)) =>
    actions$.pipe(
      ofType(JobsPage.listOpened),
      switchMap(({ query }) =>
        api.list(query).pipe(
          map((page) => JobsApi.listLoaded({ page })),
          catchProblem((problem) => JobsApi.listFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

/** Every open job: a shop has dozens, so one page holds them. */
export const loadBoard = createEffect(
  (actions$ = inject(Actions), api = inject(JobsApiClient)) =>
    actions$.pipe(
      ofType(JobsPage.boardOpened),
      switchMap(({ query }) =>
        api.list({ ...query, stage: 'open', sort: 'installOn', limit: '200' }).pipe(
          map((page) => JobsApi.boardLoaded({ page })),
          catchProblem((problem) => JobsApi.boardFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

export const loadJob = createEffect(
  (actions$ = inject(Actions), api = inject(JobsApiClient)) =>
    actions$.pipe(
      ofType(JobsPage.jobOpened),
      switchMap(({ id }) =>
        api.read(id).pipe(
          map((job) => JobsApi.jobLoaded({ job })),
          catchProblem((problem) => JobsApi.jobFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

/** A second press while the first is under way is no second job. */
export const create = createEffect(
  (actions$ = inject(Actions), api = inject(JobsApiClient)) =>
    actions$.pipe(
      ofType(JobsPage.createSubmitted),
      exhaustMap(({ fields }) =>
        api.create(fields).pipe(
          map((job) => JobsApi.created({ job })),
          catchProblem((problem) => JobsApi.saveFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

export const openCreated = createEffect(
  (actions$ = inject(Actions), router = inject(Router)) =>
    actions$.pipe(
      ofType(JobsApi.created),
      tap(({ job }) => void router.navigate(['/jobs', job.id])),
    ),
  { functional: true, dispatch: false },
);

export const edit = createEffect(
  (actions$ = inject(Actions), api = inject(JobsApiClient)) =>
    actions$.pipe(
      ofType(JobsPage.editSubmitted),
      exhaustMap(({ job, fields }) =>
        api.update(job, fields).pipe(
          map((saved) => JobsApi.saved({ job: saved })),
          catchProblem((problem) => JobsApi.saveFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

export const assign = createEffect(
  (actions$ = inject(Actions), api = inject(JobsApiClient)) =>
    actions$.pipe(
      ofType(JobsPage.crewSubmitted),
      exhaustMap(({ job, memberIds }) =>
        api.assign(job, memberIds).pipe(
          map((saved) => JobsApi.crewSaved({ job: saved })),
          catchProblem((problem) => JobsApi.saveFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

export const loadMembers = createEffect(
  (actions$ = inject(Actions), api = inject(JobsApiClient)) =>
    actions$.pipe(
      ofType(JobsPage.crewOpened),
      switchMap(() =>
        api.members().pipe(
          map((members) => JobsApi.membersLoaded({ members })),
          catchProblem((problem) => JobsApi.commandFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

/** One after the other, so that two cards that are dropped quickly both land. */
export const move = createEffect(
  (actions$ = inject(Actions), api = inject(JobsApiClient)) =>
    actions$.pipe(
      ofType(JobsPage.moveChosen),
      concatMap(({ job, move: chosen }) =>
        api.move(job, chosen).pipe(
          map((moved) => JobsApi.moved({ job: moved })),
          catchProblem((problem) =>
            asksForReason(problem)
              ? JobsApi.reasonNeeded({ job, move: chosen, problem })
              : JobsApi.moveFailed({ job, problem }),
          ),
        ),
      ),
    ),
  { functional: true },
);

const asksForReason = (problem: Problem): boolean =>
  fieldProblems(problem).some(({ path }) => path === 'reason');

/** Closing with something not billed is the person's own decision, with the reason kept. */
export const askWhy = createEffect(
  (actions$ = inject(Actions), confirm = inject(Confirm)) =>
    actions$.pipe(
      ofType(JobsApi.reasonNeeded),
      exhaustMap(({ job, move: chosen, problem }) =>
        confirm
          .ask({
            title: 'Close the job without billing the rest?',
            text: problem.detail,
            action: 'Close job',
            reason: { label: 'Why nothing more is billed', required: true },
          })
          .pipe(
            map((answer) =>
              answer
                ? JobsPage.moveChosen({ job, move: { ...chosen, reason: answer.reason.slice(0, 300) } })
                : JobsPage.jobOpened({ id: job.id }),
            ),
          ),
      ),
    ),
  { functional: true },
);

/** What was refused is shown as it stands now: on the job's page, and on the board. */
export const reloadAfterRefusal = createEffect(
  (actions$ = inject(Actions)) =>
    merge(
      actions$.pipe(
        ofType(JobsApi.moveFailed),
        map(({ job }) => JobsPage.jobOpened({ id: job.id })),
      ),
      actions$.pipe(
        ofType(JobsPage.editSubmitted, JobsPage.crewSubmitted),
        switchMap(({ job }) =>
          actions$.pipe(
            ofType(JobsApi.saveFailed),
            filter(({ problem }) => isStale(problem)),
            map(() => JobsPage.jobOpened({ id: job.id })),
          ),
        ),
      ),
    ),
  { functional: true },
);

export const loadCosts = createEffect(
  (actions$ = inject(Actions), api = inject(JobsApiClient)) =>
    actions$.pipe(
      ofType(JobsPage.costsOpened),
      switchMap(({ jobId }) =>
        api.costs(jobId).pipe(
          map((costs) => JobsApi.costsLoaded({ jobId, costs })),
          catchProblem((problem) => JobsApi.costsFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

export const addCost = createEffect(
  (actions$ = inject(Actions), api = inject(JobsApiClient)) =>
    actions$.pipe(
      ofType(JobsPage.costSubmitted),
      exhaustMap(({ jobId, cost }) =>
        api.addCost(jobId, cost).pipe(
          map(() => JobsApi.costSaved({ jobId })),
          catchProblem((problem) => JobsApi.costSaveFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

export const reverseCost = createEffect(
  (actions$ = inject(Actions), api = inject(JobsApiClient)) =>
    actions$.pipe(
      ofType(JobsPage.costReversalConfirmed),
      concatMap(({ jobId, costId, reason }) =>
        api.reverseCost(jobId, costId, reason).pipe(
          map(() => JobsApi.costReversed({ jobId })),
          catchProblem((problem) => JobsApi.commandFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

/** A cost changes every figure of the job's page: both are read again. */
export const reloadCosts = createEffect(
  (actions$ = inject(Actions)) =>
    actions$.pipe(
      ofType(JobsApi.costSaved, JobsApi.costReversed),
      map(({ jobId }) => JobsPage.costsOpened({ jobId })),
    ),
  { functional: true },
);

export const reloadCostedJob = createEffect(
  (actions$ = inject(Actions)) =>
    actions$.pipe(
      ofType(JobsApi.costSaved, JobsApi.costReversed),
      map(({ jobId }) => JobsPage.jobOpened({ id: jobId })),
    ),
  { functional: true },
);

export const loadFiles = createEffect(
  (actions$ = inject(Actions), api = inject(JobsApiClient)) =>
    actions$.pipe(
      ofType(JobsPage.filesOpened),
      switchMap(({ jobId }) =>
        api.files(jobId).pipe(
          map((files) => JobsApi.filesLoaded({ jobId, files })),
          catchProblem((problem) => JobsApi.filesFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

export const removeFile = createEffect(
  (actions$ = inject(Actions), api = inject(JobsApiClient)) =>
    actions$.pipe(
      ofType(JobsPage.fileRemovalConfirmed),
      concatMap(({ jobId, fileId }) =>
        api.removeFile(jobId, fileId).pipe(
          map(() => JobsApi.fileRemoved({ jobId, fileId })),
          catchProblem((problem) => JobsApi.commandFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

export const billStage = createEffect(
  (actions$ = inject(Actions), api = inject(JobsApiClient)) =>
    actions$.pipe(
      ofType(JobsPage.billStagePressed),
      exhaustMap(({ jobId, billingStageId }) =>
        api.billStage(jobId, billingStageId).pipe(
          map(({ id }) => JobsApi.stageBilled({ invoiceId: id })),
          catchProblem((problem) => JobsApi.commandFailed({ problem })),
        ),
      ),
    ),
  { functional: true },
);

/** The draft is the next stop of the thread: there it is looked at and issued. */
export const openInvoice = createEffect(
  (actions$ = inject(Actions), router = inject(Router)) =>
    actions$.pipe(
      ofType(JobsApi.stageBilled),
      tap(({ invoiceId }) => void router.navigate(['/invoices', invoiceId])),
    ),
  { functional: true, dispatch: false },
);

const DONE: Record<string, string> = {
  [JobsApi.created.type]: 'Job added.',
  [JobsApi.saved.type]: 'Job saved.',
  [JobsApi.crewSaved.type]: 'Crew saved.',
  [JobsApi.costSaved.type]: 'Cost entered.',
  [JobsApi.costReversed.type]: 'Cost reversed.',
  [JobsApi.fileRemoved.type]: 'File removed.',
  [JobsApi.stageBilled.type]: 'Invoice drafted.',
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
      ofType(JobsApi.commandFailed, JobsApi.moveFailed),
      tap(({ problem }) => notices.problem(problem)),
    ),
  { functional: true, dispatch: false },
);
