import type { Refusal } from '../problems/problem.js';
import { JOB_STAGES, type JobStage } from './jobs-contract.js';

export const JOB_STAGE_NAMES: Record<JobStage, string> = {
  accepted: 'Accepted',
  measured: 'Measured',
  'drawings-approved': 'Drawings approved',
  'materials-in': 'Materials in',
  building: 'Building',
  finishing: 'Finishing',
  installing: 'Installing',
  closed: 'Closed',
};

/**
 * Where a job can go from where it is: on, and back when a stage was set too early. A closed job is opened again by
 * going back to installing, where the last of the work is done.
 */
export const JOB_TRANSITIONS: Record<JobStage, readonly JobStage[]> = {
  accepted: allBut('accepted'),
  measured: allBut('measured'),
  'drawings-approved': allBut('drawings-approved'),
  'materials-in': allBut('materials-in'),
  building: allBut('building'),
  finishing: allBut('finishing'),
  installing: allBut('installing'),
  closed: ['installing'],
};

function allBut(stage: JobStage): JobStage[] {
  return JOB_STAGES.filter((other) => other !== stage);
}

/** The next step of the thread; null when the job is closed. */
export function nextStage(stage: JobStage): JobStage | null {
  return JOB_STAGES[JOB_STAGES.indexOf(stage) + 1] ?? null;
}

/** The stages between two that a move leaves out; none when it goes back or one step on. */
export function skippedStages(from: JobStage, to: JobStage): JobStage[] {
  return JOB_STAGES.slice(JOB_STAGES.indexOf(from) + 1, Math.max(0, JOB_STAGES.indexOf(to)));
}

export type StageMove = { from: JobStage; to: JobStage; confirmSkip: boolean };

/** Why a job cannot go from one stage to another, or null. */
export function refuseMove({ from, to, confirmSkip }: StageMove): Refusal | null {
  if (from === to) return conflict(`The job is at ${JOB_STAGE_NAMES[to]} already.`);
  if (!JOB_TRANSITIONS[from].includes(to))
    return conflict('A closed job is opened again by moving it back to Installing.');
  const skipped = skippedStages(from, to);
  if (skipped.length === 0 || confirmSkip) return null;
  return conflict(
    `This skips ${inWords(skipped.map((stage) => JOB_STAGE_NAMES[stage]))}. Confirm it to go on.`,
  );
}

export type ClosingFacts = {
  /** Names of the members whose clock runs on the job. */
  clockedIn: readonly string[];
  /** Names of the billing stages without an issued invoice. */
  unbilledStages: readonly string[];
  /** Why it is closed all the same; empty when nobody gave a reason. */
  reason: string;
};

/**
 * Why a job cannot be closed, or null. Time still running would land on a closed job, and a stage forgotten at closing
 * is never billed: that one can be overruled with a reason.
 */
export function refuseClosing({ clockedIn, unbilledStages, reason }: ClosingFacts): Refusal | null {
  if (clockedIn.length > 0)
    return conflict(`${inWords(clockedIn)} ${clockedIn.length === 1 ? 'is' : 'are'} clocked in to this job.`);
  if (unbilledStages.length === 0 || reason !== '') return null;
  const detail = `${inWords(unbilledStages)} ${unbilledStages.length === 1 ? 'is' : 'are'} not billed yet. Bill first, or say why the job is closed without.`;
  return {
    code: 'conflict',
    detail,
    fields: [{ path: 'reason', message: 'Say why nothing more is billed.' }],
  };
}

/** `Sam`, `Sam and Ada`, `Sam, Ada and Jo`. */
function inWords(names: readonly string[]): string {
  return names.length < 2 ? names.join('') : `${names.slice(0, -1).join(', ')} and ${names.at(-1)}`;
}

function conflict(detail: string): Refusal {
  return { code: 'conflict', detail };
}
