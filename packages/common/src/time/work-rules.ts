import type { Refusal } from '../problems/problem.js';
import type { TimeEntryFacts } from './time-contract.js';

/** What time is clocked to, as far as it decides whether that can be. */
export type Work = {
  job: { closed: boolean } | null;
  operation: { onJob: boolean; archived: boolean };
};

/** Why new time cannot be clocked to a job and an operation, or null. */
export function refuseWork({ job, operation }: Work): Refusal | null {
  if (job?.closed) return refusal('jobId', 'This job is closed.');
  if (operation.archived) return refusal('operationId', 'This operation is not used any more.');
  return refusePairing({ job, operation });
}

/** Why a job and an operation do not go together, or null: some operations belong to a job, the others to none. */
export function refusePairing({ job, operation }: Work): Refusal | null {
  if (job && !operation.onJob) return refusal('operationId', 'This operation belongs to no job.');
  if (!job && operation.onJob) return refusal('jobId', 'This operation is done on a job. Choose the job.');
  return null;
}

/** Why an entry cannot stand like this, or null: work is of an operation, a meal break of nothing. */
export function refuseFacts({ kind, jobId, operationId }: TimeEntryFacts): Refusal | null {
  if (kind === 'work') return operationId === null ? refusal('operationId', 'Choose an operation.') : null;
  return jobId === null && operationId === null
    ? null
    : refusal('kind', 'A meal break has neither a job nor an operation.');
}

function refusal(path: string, detail: string): Refusal {
  return { code: 'conflict', detail, fields: [{ path, message: detail }] };
}
