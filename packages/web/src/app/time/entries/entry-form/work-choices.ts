import type { ClockJobs } from '@bookmatch/common/time/clock-contract';
import type { TimeEntryRow } from '@bookmatch/common/time/time-contract';

export type WorkChoice = { value: string; name: string };

/** The open jobs, and the one the entry is on although it may be closed by now. */
export function jobChoices(work: ClockJobs | null, entry: TimeEntryRow | null): WorkChoice[] {
  const open = (work?.jobs ?? []).map(({ jobId, jobNumber, jobTitle }) => named(jobId, jobNumber, jobTitle));
  if (!entry?.jobId || open.some(({ value }) => value === entry.jobId)) return open;
  return [named(entry.jobId, entry.jobNumber, entry.jobTitle), ...open];
}

/** The operations that go with the job, or with none; and the one the entry has although it may be archived by now. */
export function operationChoices(
  work: ClockJobs | null,
  entry: TimeEntryRow | null,
  jobId: string,
): WorkChoice[] {
  const inUse = (work?.operations ?? [])
    .filter(({ onJob }) => onJob === (jobId !== ''))
    .map(({ operationId, operationName }) => ({ value: operationId, name: operationName }));
  const { operationId = null, operationName = null } = entry ?? {};
  const fits = (entry?.jobId === null) === (jobId === '');
  if (!operationId || !fits || inUse.some(({ value }) => value === operationId)) return inUse;
  return [{ value: operationId, name: operationName ?? '' }, ...inUse];
}

const named = (value: string, number: number | null, title: string | null): WorkChoice => ({
  value,
  name: `${number ?? ''} · ${title ?? ''}`,
});
