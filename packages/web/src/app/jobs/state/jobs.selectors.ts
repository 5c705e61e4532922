import { JOB_STAGES, type JobRow, type JobStage } from '@bookmatch/common/jobs/jobs-contract';
import { JOB_STAGE_NAMES } from '@bookmatch/common/jobs/job-stages';
import { createSelector } from '@ngrx/store';
import type { ListState } from '../../platform/lists/list-state';
import { jobList, jobsFeature } from './jobs.state';

const { selectList, selectBoard, selectOpened } = jobsFeature;

export const { selectOpenProblem, selectSave, selectCosts, selectCostSave, selectFiles, selectBilling } =
  jobsFeature;

/** All that the list's screen shows. */
export const selectJobList = createSelector(selectList, shown);

export type BoardColumn = { stage: JobStage; name: string; rows: JobRow[] };

/** The open jobs by stage, the soonest install first within each, as the server ordered them. */
export const selectJobBoard = createSelector(selectBoard, (board) => {
  const { rows, ...rest } = shown(board);
  const columns = JOB_STAGES.filter((stage) => stage !== 'closed').map((stage): BoardColumn => ({
    stage,
    name: JOB_STAGE_NAMES[stage],
    rows: rows.filter((row) => row.stage === stage),
  }));
  return { ...rest, columns, empty: rows.length === 0 };
});

export const selectJob = (id: string) => createSelector(selectOpened, ({ entities }) => entities[id] ?? null);

/** Who can be put on a job, by name. */
export const selectMembers = createSelector(jobsFeature.selectMembers, (members) =>
  members.toSorted((a, b) => a.name.localeCompare(b.name)),
);

function shown(list: ListState<JobRow>) {
  return {
    rows: jobList.selectRows(list),
    loading: list.status === 'idle' || list.status === 'loading',
    problem: list.problem,
    next: list.next,
    total: list.total,
  };
}
