import { buildJob } from '@bookmatch/common/testing/build-job';
import type { Action } from '@ngrx/store';
import { buildJobFile, buildJobRow, idOf } from '../testing/build-jobs';
import { JobsApi, JobsPage } from './jobs.actions';
import { selectJob, selectJobBoard } from './jobs.selectors';
import { initialJobs, jobsFeature, type JobsState } from './jobs.state';

const after = (...actions: Action[]): JobsState => actions.reduce(jobsFeature.reducer, initialJobs);
const inStore = (state: JobsState) => ({ [jobsFeature.name]: state });
const problem = { type: '', title: '', status: 409, code: 'conflict', detail: 'Not now.' };

describe('the state of jobs', () => {
  const row = buildJobRow();
  const board = JobsApi.boardLoaded({ page: { rows: [row], next: null } });
  const chosen = JobsPage.moveChosen({
    job: { id: row.id, version: 1 },
    move: { stage: 'finishing', confirmSkip: false, reason: '' },
  });
  const stageOf = (state: JobsState) =>
    selectJobBoard(inStore(state)).columns.find(({ rows }) => rows.length > 0)?.stage;

  it('moves a card at once, keeps it when the server agrees, with the new version', () => {
    expect(stageOf(after(board, chosen))).toBe('finishing');
    const job = buildJob({ id: row.id, version: 2, stage: 'finishing' });
    const moved = after(board, chosen, JobsApi.moved({ job }));
    expect(stageOf(moved)).toBe('finishing');
    expect(moved.board.entities[row.id]?.version).toBe(2);
  });

  it('puts it back with what is read again after a refusal', () => {
    const job = buildJob({ id: row.id, version: 3, stage: 'building' });
    const refused = after(board, chosen, JobsApi.moveFailed({ job, problem }), JobsApi.jobLoaded({ job }));
    expect(stageOf(refused)).toBe('building');
  });

  it('has no card of a job that was closed', () => {
    const job = buildJob({ id: row.id, stage: 'closed' });
    expect(stageOf(after(board, JobsApi.moved({ job })))).toBeUndefined();
  });

  it('shows files of the job that is open, and never those of another', () => {
    const file = buildJobFile();
    const opened = after(
      JobsPage.filesOpened({ jobId: idOf(1) }),
      JobsApi.filesLoaded({ jobId: idOf(1), files: [file] }),
    );
    const added = jobsFeature.reducer(
      opened,
      JobsPage.fileUploaded({ jobId: idOf(1), file: buildJobFile({ id: idOf(41) }) }),
    );
    expect(added.files.rows.map(({ id }) => id)).toEqual([idOf(41), idOf(40)]);
    const again = jobsFeature.reducer(added, JobsPage.fileUploaded({ jobId: idOf(1), file }));
    expect(again.files.rows.map(({ id }) => id)).toEqual([idOf(40), idOf(41)]);
    const late = jobsFeature.reducer(added, JobsPage.fileUploaded({ jobId: idOf(2), file: buildJobFile() }));
    expect(late).toBe(added);
    expect(jobsFeature.reducer(added, JobsPage.filesOpened({ jobId: idOf(2) })).files.rows).toEqual([]);
    const gone = jobsFeature.reducer(added, JobsApi.fileRemoved({ jobId: idOf(1), fileId: idOf(40) }));
    expect(gone.files.rows.map(({ id }) => id)).toEqual([idOf(41)]);
  });

  it('forgets the outcome of a form when the next one opens', () => {
    const failed = after(JobsApi.saveFailed({ problem }));
    expect(failed.save.problem).toBe(problem);
    expect(jobsFeature.reducer(failed, JobsPage.crewOpened()).save).toEqual({
      status: 'idle',
      problem: null,
    });
  });

  it('knows a job by its id once it was read', () => {
    const job = buildJob();
    const state = inStore(after(JobsApi.jobLoaded({ job })));
    expect(selectJob(job.id)(state)).toEqual(job);
    expect(selectJob(idOf(9))(state)).toBeNull();
  });
});
