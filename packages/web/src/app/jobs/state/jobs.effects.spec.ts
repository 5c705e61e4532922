import { buildJob } from '@bookmatch/common/testing/build-job';
import { Actions } from '@ngrx/effects';
import type { Action } from '@ngrx/store';
import { firstValueFrom, NEVER, of, Subject, throwError, toArray, type Observable } from 'rxjs';
import { ApiProblem } from '../../platform/api/api-problem';
import type { Confirm } from '../../ui/confirm/confirm';
import type { JobsApiClient } from '../jobs-api';
import { idOf } from '../testing/build-jobs';
import { JobsApi, JobsPage } from './jobs.actions';
import * as effects from './jobs.effects';

const job = buildJob({ version: 4 });
const ref = { id: job.id, version: 4 };
const close = { stage: 'closed', confirmSkip: true, reason: '' } as const;
const problem = {
  type: '',
  title: '',
  status: 409,
  code: 'conflict',
  detail: 'Installed is not billed yet.',
};
const asks = { ...problem, fields: [{ path: 'reason', message: 'Say why.' }] };
const refusedWith = (what: typeof problem) => () => throwError(() => new ApiProblem(what));
const actions = (...list: Action[]) => new Actions(of(...list));
const api = (methods: Partial<JobsApiClient>) => methods as JobsApiClient;
const all = (stream: Observable<Action>) => firstValueFrom(stream.pipe(toArray()));

describe('jobs effects', () => {
  it('show only the answer to the last question', async () => {
    const page = { rows: [], next: null };
    const list = jest.fn().mockReturnValueOnce(NEVER).mockReturnValueOnce(of(page));
    const asked = actions(JobsPage.listOpened({ query: { q: 'w' } }), JobsPage.listOpened({ query: {} }));
    expect(await all(effects.loadList(asked, api({ list })))).toEqual([JobsApi.listLoaded({ page })]);
  });

  it('ask for every open job on the board, the soonest install first', async () => {
    const list = jest.fn(() => of({ rows: [], next: null }));
    await all(effects.loadBoard(actions(JobsPage.boardOpened({ query: { q: 'oak' } })), api({ list })));
    expect(list).toHaveBeenCalledWith({ q: 'oak', stage: 'open', sort: 'installOn', limit: '200' });
  });

  it('move jobs one after the other, with the version each was read at', async () => {
    const first = new Subject<typeof job>();
    const move = jest.fn().mockReturnValueOnce(first).mockReturnValueOnce(of(job));
    const press = JobsPage.moveChosen({ job: ref, move: close });
    const results = all(effects.move(actions(press, press), api({ move })));
    expect(move).toHaveBeenCalledTimes(1);
    first.next(job);
    first.complete();
    expect(await results).toEqual([JobsApi.moved({ job }), JobsApi.moved({ job })]);
    expect(move).toHaveBeenCalledWith(ref, close);
  });

  it('tell a refusal that a reason lifts from one that stands', async () => {
    const press = JobsPage.moveChosen({ job: ref, move: close });
    expect(await all(effects.move(actions(press), api({ move: refusedWith(asks) })))).toEqual([
      JobsApi.reasonNeeded({ job: ref, move: close, problem: asks }),
    ]);
    expect(await all(effects.move(actions(press), api({ move: refusedWith(problem) })))).toEqual([
      JobsApi.moveFailed({ job: ref, problem }),
    ]);
  });

  it('ask why before a job is closed unbilled, and read it again when nobody says', async () => {
    const needed = JobsApi.reasonNeeded({ job: ref, move: close, problem: asks });
    const answering = (answer: { reason: string } | undefined) =>
      ({ ask: jest.fn(() => of(answer)) }) as unknown as Confirm;
    expect(await all(effects.askWhy(actions(needed), answering({ reason: 'A gift' })))).toEqual([
      JobsPage.moveChosen({ job: ref, move: { ...close, reason: 'A gift' } }),
    ]);
    expect(await all(effects.askWhy(actions(needed), answering(undefined)))).toEqual([
      JobsPage.jobOpened({ id: job.id }),
    ]);
  });

  it('read the newer version after a conflict, and after nothing else', () => {
    const stream = new Subject<Action>();
    const seen: Action[] = [];
    effects.reloadAfterRefusal(new Actions(stream)).subscribe((action) => seen.push(action));
    stream.next(JobsPage.editSubmitted({ job: ref, fields: { notes: 'x' } }));
    stream.next(JobsApi.saveFailed({ problem }));
    expect(seen).toEqual([]);
    stream.next(JobsApi.saveFailed({ problem: { ...problem, code: 'stale-version' } }));
    expect(seen).toEqual([JobsPage.jobOpened({ id: job.id })]);
  });

  it('read costs and job again after a cost, since every figure changed', async () => {
    const saved = () => actions(JobsApi.costSaved({ jobId: job.id }));
    expect(await all(effects.reloadCosts(saved()))).toEqual([JobsPage.costsOpened({ jobId: job.id })]);
    expect(await all(effects.reloadCostedJob(saved()))).toEqual([JobsPage.jobOpened({ id: job.id })]);
  });

  it('draft one invoice of a stage, however often it is pressed', async () => {
    const answer = new Subject<{ id: string }>();
    const billStage = jest.fn(() => answer) as unknown as JobsApiClient['billStage'];
    const press = JobsPage.billStagePressed({ jobId: job.id, billingStageId: idOf(20) });
    const results = all(effects.billStage(actions(press, press), api({ billStage })));
    answer.next({ id: idOf(50) });
    answer.complete();
    expect(await results).toEqual([JobsApi.stageBilled({ invoiceId: idOf(50) })]);
    expect(billStage).toHaveBeenCalledTimes(1);
  });
});
