import type {
  AssignJob,
  CreateJob,
  Job as JobView,
  MoveJob,
  UpdateJob,
} from '@bookmatch/common/jobs/jobs-contract';
import { refuseClosing, refuseMove } from '@bookmatch/common/jobs/job-stages';
import type { ShopScope } from '../../platform/database/scope.js';
import { invalid, refuse } from '../../platform/http/problem-error.js';
import { Member } from '../shops/shops-public.js';
import { changeJob, readJob, type AccessedJob } from './job-access.js';
import { JobAssignment } from './job-assignment.entity.js';
import { unbilledStages } from './billing-stages.js';
import { createJobByHand, NO_INSTALL_DATE } from './job-creation.js';
import { JobStageChange } from './job-stage-change.entity.js';
import { viewJob, type JobReaders } from './job-view.js';
import { Job } from './job.entity.js';

/** Called in the transaction that closes a job: its deposits turn into sales. */
export type OnJobClosed = (scope: ShopScope, job: Job) => Promise<void>;
export type JobsParts = JobReaders & { onClosed: OnJobClosed };

/** Jobs: accepted work, from acceptance to the day it is closed. */
export class JobsService {
  constructor(private readonly parts: JobsParts) {}

  async get(scope: ShopScope, id: string): Promise<JobView> {
    return viewJob(scope, await readJob(scope, id), this.parts);
  }

  async create(scope: ShopScope, input: CreateJob): Promise<JobView> {
    return this.get(scope, (await createJobByHand(scope, input)).id);
  }

  async update(scope: ShopScope, id: string, input: UpdateJob, version: number): Promise<JobView> {
    const job = await changeJob(scope, id);
    const { installOn } = input;
    const order = installOn === undefined ? {} : { installOrder: installOn ?? NO_INSTALL_DATE };
    await scope.rows(Job).update(job, { ...input, ...order }, version);
    return this.get(scope, id);
  }

  /** Takes a job to another stage and keeps who did it when. */
  async move(scope: ShopScope, id: string, input: MoveJob, version: number): Promise<JobView> {
    const job = await changeJob(scope, id);
    refuse(refuseMove({ from: job.stage, to: input.stage, confirmSkip: input.confirmSkip }));
    const closes = input.stage === 'closed';
    if (closes) await this.checkClosing(scope, job, input.reason);
    const moved = await scope
      .rows(Job)
      .update(
        job,
        { stage: input.stage, stageChangedAt: scope.now, closedAt: closes ? scope.now : null },
        version,
      );
    await scope.rows(JobStageChange).insert({
      id: scope.newId(),
      jobId: id,
      fromStage: job.stage,
      toStage: input.stage,
      memberId: scope.memberId,
      reason: input.reason,
    });
    if (closes) await this.parts.onClosed(scope, moved);
    return this.get(scope, id);
  }

  /** Puts the members on the job that are named, and takes the others off. */
  async assign(scope: ShopScope, id: string, input: AssignJob, version: number): Promise<JobView> {
    const job = await changeJob(scope, id);
    const wanted = [...new Set(input.memberIds)];
    const added = wanted.filter((memberId) => !job.assignedMemberIds.includes(memberId));
    await requireMembers(scope, added);
    // Who works on a job is part of it: two who assign at once are told.
    await scope.rows(Job).update(job, { assignedAt: scope.now }, version);
    const assignments = scope.rows(JobAssignment);
    for (const row of await assignments.findBy({ jobId: id }))
      if (!wanted.includes(row.memberId)) await assignments.delete(row);
    await assignments.insertMany(added.map((memberId) => ({ id: scope.newId(), jobId: id, memberId })));
    return this.get(scope, id);
  }

  private async checkClosing(scope: ShopScope, job: AccessedJob, reason: string): Promise<void> {
    const [clockedIn, invoices] = await Promise.all([
      this.parts.time.clockedIn(scope, job.id),
      this.parts.billing.invoicesOf(scope, job.id),
    ]);
    refuse(
      refuseClosing({ clockedIn, unbilledStages: await unbilledStages(scope, job.id, invoices), reason }),
    );
  }
}

async function requireMembers(scope: ShopScope, memberIds: readonly string[]): Promise<void> {
  const members = await scope.rows(Member).findBy({ id: memberIds });
  if (members.filter((member) => member.removedAt === null).length !== memberIds.length)
    throw invalid('memberIds', 'Choose members of this shop.');
}
