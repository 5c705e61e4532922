import { refusePairing, refuseWork } from '@bookmatch/common/time/work-rules';
import type { ShopScope } from '../../platform/database/scope.js';
import { notFound, ProblemError, refuse } from '../../platform/http/problem-error.js';
import { lockReadableJob, readJob, type AccessedJob } from '../jobs/jobs-public.js';
import { Operation } from '../shops/shops-public.js';

export type WorkRef = { jobId: string | null; operationId: string | null };

/**
 * Checks what new time is to be clocked to: a job that the actor may see and that is open, an operation in use. The job
 * stays locked, so that it is not closed in between.
 *
 * @throws not-found for a job or an operation that does not exist, is another shop's, or may not be seen
 */
export async function checkNewWork(scope: ShopScope, { jobId, operationId }: WorkRef): Promise<void> {
  if (operationId === null) return;
  const job = jobId === null ? null : await jobOf(lockReadableJob(scope, jobId));
  const operation = await operationOf(scope, operationId);
  refuse(refuseWork({ job: job && { closed: job.closedAt !== null }, operation }));
}

/** Checks what corrected time is put on. The past stays open: a closed job and an archived operation may be named. */
export async function checkCorrectedWork(scope: ShopScope, { jobId, operationId }: WorkRef): Promise<void> {
  if (operationId === null) return;
  const job = jobId === null ? null : await jobOf(readJob(scope, jobId));
  const operation = await operationOf(scope, operationId);
  refuse(refusePairing({ job: job && { closed: false }, operation }));
}

/** The refusal names the job: a punch that was kept for a while is read by somebody who no longer thinks of it. */
async function jobOf(reading: Promise<AccessedJob>): Promise<AccessedJob> {
  try {
    return await reading;
  } catch (error) {
    throw error instanceof ProblemError && error.code === 'not-found' ? notFound('This job') : error;
  }
}

async function operationOf(scope: ShopScope, id: string) {
  const operation = await scope.rows(Operation).find(id);
  if (!operation) throw notFound('This operation');
  return { onJob: operation.onJob, archived: operation.archivedAt !== null };
}
