import type { CreateJobCost, JobCost } from '@bookmatch/common/jobs/job-costs-contract';
import type { JobFile } from '@bookmatch/common/jobs/job-files-contract';
import type { CreateJob, Job, JobRow, MoveJob, UpdateJob } from '@bookmatch/common/jobs/jobs-contract';
import type { Problem } from '@bookmatch/common/problems/problem';
import type { Member } from '@bookmatch/common/shops/members-contract';
import type { Page } from '@bookmatch/common/wire/list';
import { createActionGroup, emptyProps, props } from '@ngrx/store';
import type { ListQuery } from '../../platform/lists/list-address';
import type { JobRef } from '../jobs-api';

/** What happened on the screens. */
export const JobsPage = createActionGroup({
  source: 'Jobs Page',
  events: {
    listOpened: props<{ query: ListQuery }>(),
    boardOpened: props<{ query: ListQuery }>(),
    jobOpened: props<{ id: string }>(),
    formOpened: emptyProps(),
    createSubmitted: props<{ fields: CreateJob }>(),
    editSubmitted: props<{ job: JobRef; fields: UpdateJob }>(),
    moveChosen: props<{ job: JobRef; move: MoveJob }>(),
    crewOpened: emptyProps(),
    crewSubmitted: props<{ job: JobRef; memberIds: string[] }>(),
    costsOpened: props<{ jobId: string }>(),
    costFormOpened: emptyProps(),
    costSubmitted: props<{ jobId: string; cost: CreateJobCost }>(),
    costReversalConfirmed: props<{ jobId: string; costId: string; reason: string }>(),
    filesOpened: props<{ jobId: string }>(),
    fileUploaded: props<{ jobId: string; file: JobFile }>(),
    fileRemovalConfirmed: props<{ jobId: string; fileId: string }>(),
    billStagePressed: props<{ jobId: string; billingStageId: string }>(),
  },
});

/** What the server said. */
export const JobsApi = createActionGroup({
  source: 'Jobs API',
  events: {
    listLoaded: props<{ page: Page<JobRow> }>(),
    listFailed: props<{ problem: Problem }>(),
    boardLoaded: props<{ page: Page<JobRow> }>(),
    boardFailed: props<{ problem: Problem }>(),
    jobLoaded: props<{ job: Job }>(),
    jobFailed: props<{ problem: Problem }>(),
    created: props<{ job: Job }>(),
    saved: props<{ job: Job }>(),
    saveFailed: props<{ problem: Problem }>(),
    moved: props<{ job: Job }>(),
    /** The job can be closed only by who says why. */
    reasonNeeded: props<{ job: JobRef; move: MoveJob; problem: Problem }>(),
    moveFailed: props<{ job: JobRef; problem: Problem }>(),
    membersLoaded: props<{ members: Member[] }>(),
    crewSaved: props<{ job: Job }>(),
    costsLoaded: props<{ jobId: string; costs: JobCost[] }>(),
    costsFailed: props<{ problem: Problem }>(),
    costSaved: props<{ jobId: string }>(),
    costSaveFailed: props<{ problem: Problem }>(),
    costReversed: props<{ jobId: string }>(),
    filesLoaded: props<{ jobId: string; files: JobFile[] }>(),
    filesFailed: props<{ problem: Problem }>(),
    fileRemoved: props<{ jobId: string; fileId: string }>(),
    stageBilled: props<{ invoiceId: string }>(),
    /** A command without a form of its own was refused. */
    commandFailed: props<{ problem: Problem }>(),
  },
});
