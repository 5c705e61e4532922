import type { ClockJobs } from '@bookmatch/common/time/clock-contract';

type ClockJob = ClockJobs['jobs'][number];
export type OfferedOperation = { operationId: string; operationName: string; minutesLeft: number | null };

/** The jobs whose number or title holds what was typed; all of them while nothing was. */
export function findJobs(all: ClockJobs | null, typed: string): readonly ClockJob[] {
  const words = typed.trim().toLowerCase();
  return (all?.jobs ?? []).filter(({ jobNumber, jobTitle }) =>
    `${jobNumber} ${jobTitle}`.toLowerCase().includes(words),
  );
}

/** What can be done on a job, planned operations first; without one, what belongs to no job. */
export function operationsFor(all: ClockJobs | null, job: ClockJob | null): OfferedOperation[] {
  const operations = (all?.operations ?? []).filter(({ onJob }) => onJob === (job !== null));
  const left = new Map(job?.planned.map(({ operationId, minutesLeft }) => [operationId, minutesLeft]));
  const offered = operations.map(({ operationId, operationName }) => ({
    ...{ operationId, operationName, minutesLeft: left.get(operationId) ?? null },
  }));
  return [
    ...offered.filter(({ minutesLeft }) => minutesLeft !== null),
    ...offered.filter(({ minutesLeft }) => minutesLeft === null),
  ];
}
