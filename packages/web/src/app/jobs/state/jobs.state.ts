import type { JobCost } from '@bookmatch/common/jobs/job-costs-contract';
import type { JobFile } from '@bookmatch/common/jobs/job-files-contract';
import type { Job, JobRow } from '@bookmatch/common/jobs/jobs-contract';
import type { Problem } from '@bookmatch/common/problems/problem';
import type { Member } from '@bookmatch/common/shops/members-contract';
import { createEntityAdapter, type EntityState } from '@ngrx/entity';
import { createFeature, createReducer, on } from '@ngrx/store';
import { notSaved, saved, saveFailed, saving, type SaveState } from '../../platform/forms/save-state';
import { createListState, type ListState } from '../../platform/lists/list-state';
import { JobsApi, JobsPage } from './jobs.actions';

/** What belongs to one job and is read beside it; rows of another job are never shown for this one. */
export type Beside<Row> = {
  jobId: string | null;
  rows: readonly Row[];
  loading: boolean;
  problem: Problem | null;
};

export type JobsState = {
  list: ListState<JobRow>;
  board: ListState<JobRow>;
  /** The jobs that were opened. */
  opened: EntityState<Job>;
  openProblem: Problem | null;
  /** The create form, the edit form and the crew form: one is open at a time. */
  save: SaveState;
  costs: Beside<JobCost>;
  costSave: SaveState;
  files: Beside<JobFile>;
  members: readonly Member[];
  /** A stage's invoice is being drafted. */
  billing: boolean;
};

export const jobList = createListState<JobRow>();
export const openedJobs = createEntityAdapter<Job>();
const nothingBeside = { jobId: null, rows: [], loading: false, problem: null };

export const initialJobs: JobsState = {
  list: jobList.initial,
  board: jobList.initial,
  opened: openedJobs.getInitialState(),
  openProblem: null,
  save: notSaved,
  costs: nothingBeside,
  costSave: notSaved,
  files: nothingBeside,
  members: [],
  billing: false,
};

export const jobsFeature = createFeature({
  name: 'jobs',
  reducer: createReducer(
    initialJobs,
    on(JobsPage.listOpened, (state): JobsState => ({ ...state, list: jobList.requested(state.list) })),
    on(JobsApi.listLoaded, (state, { page }): JobsState => ({
      ...state,
      list: jobList.loaded(state.list, page),
    })),
    on(JobsApi.listFailed, (state, { problem }): JobsState => ({
      ...state,
      list: jobList.failed(state.list, problem),
    })),
    on(JobsPage.boardOpened, (state): JobsState => ({ ...state, board: jobList.requested(state.board) })),
    on(JobsApi.boardLoaded, (state, { page }): JobsState => ({
      ...state,
      board: jobList.loaded(state.board, page),
    })),
    on(JobsApi.boardFailed, (state, { problem }): JobsState => ({
      ...state,
      board: jobList.failed(state.board, problem),
    })),
    on(JobsPage.jobOpened, (state): JobsState => ({ ...state, openProblem: null })),
    on(JobsApi.jobFailed, (state, { problem }): JobsState => ({ ...state, openProblem: problem })),
    on(JobsApi.jobLoaded, JobsApi.moved, (state, { job }): JobsState => onBoard(withJob(state, job), job)),
    // A card goes to its new place at once, and back when the server refuses.
    on(JobsPage.moveChosen, (state, { job, move }): JobsState => ({
      ...state,
      board: openedAs(state.board, job.id, { stage: move.stage }),
    })),
    on(JobsPage.formOpened, JobsPage.crewOpened, (state): JobsState => ({ ...state, save: notSaved })),
    on(JobsPage.createSubmitted, JobsPage.editSubmitted, JobsPage.crewSubmitted, (state): JobsState => ({
      ...state,
      save: saving,
    })),
    on(JobsApi.created, JobsApi.saved, JobsApi.crewSaved, (state, { job }): JobsState => ({
      ...withJob(state, job),
      save: saved,
    })),
    on(JobsApi.saveFailed, (state, { problem }): JobsState => ({ ...state, save: saveFailed(problem) })),
    on(JobsApi.membersLoaded, (state, { members }): JobsState => ({ ...state, members })),
    on(JobsPage.costsOpened, (state, { jobId }): JobsState => ({
      ...state,
      costs: requested(state.costs, jobId),
    })),
    on(JobsApi.costsLoaded, (state, { jobId, costs }): JobsState => ({
      ...state,
      costs: { jobId, rows: costs, loading: false, problem: null },
    })),
    on(JobsApi.costsFailed, (state, { problem }): JobsState => ({
      ...state,
      costs: { ...state.costs, loading: false, problem },
    })),
    on(JobsPage.costFormOpened, (state): JobsState => ({ ...state, costSave: notSaved })),
    on(JobsPage.costSubmitted, (state): JobsState => ({ ...state, costSave: saving })),
    on(JobsApi.costSaved, (state): JobsState => ({ ...state, costSave: saved })),
    on(JobsApi.costSaveFailed, (state, { problem }): JobsState => ({
      ...state,
      costSave: saveFailed(problem),
    })),
    on(JobsPage.filesOpened, (state, { jobId }): JobsState => ({
      ...state,
      files: requested(state.files, jobId),
    })),
    on(JobsApi.filesLoaded, (state, { jobId, files }): JobsState => ({
      ...state,
      files: { jobId, rows: files, loading: false, problem: null },
    })),
    on(JobsApi.filesFailed, (state, { problem }): JobsState => ({
      ...state,
      files: { ...state.files, loading: false, problem },
    })),
    on(JobsPage.fileUploaded, (state, { jobId, file }): JobsState =>
      withFiles(state, jobId, (rows) => [file, ...rows.filter(({ id }) => id !== file.id)]),
    ),
    on(JobsApi.fileRemoved, (state, { jobId, fileId }): JobsState =>
      withFiles(state, jobId, (rows) => rows.filter(({ id }) => id !== fileId)),
    ),
    on(JobsPage.billStagePressed, (state): JobsState => ({ ...state, billing: true })),
    on(JobsApi.stageBilled, JobsApi.commandFailed, (state): JobsState => ({ ...state, billing: false })),
  ),
});

function withJob(state: JobsState, job: Job): JobsState {
  return { ...state, opened: openedJobs.upsertOne(job, state.opened) };
}

function onBoard(state: JobsState, { id, version, stage }: Job): JobsState {
  return { ...state, board: openedAs(state.board, id, { version, stage }) };
}

function openedAs(board: ListState<JobRow>, id: string, changes: Partial<JobRow>): ListState<JobRow> {
  const row = board.entities[id];
  return row ? jobList.changed(board, { ...row, ...changes }) : board;
}

function requested<Row>(beside: Beside<Row>, jobId: string): Beside<Row> {
  const rows = beside.jobId === jobId ? beside.rows : [];
  return { jobId, rows, loading: true, problem: null };
}

function withFiles(
  state: JobsState,
  jobId: string,
  change: (rows: readonly JobFile[]) => JobFile[],
): JobsState {
  if (state.files.jobId !== jobId) return state;
  return { ...state, files: { ...state.files, rows: change(state.files.rows) } };
}
