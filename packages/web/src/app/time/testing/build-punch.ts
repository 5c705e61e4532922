import type { ClockChoice, ClockJobs, ClockState } from '@bookmatch/common/time/clock-contract';
import { buildTimeEntryRow } from '@bookmatch/common/testing/build-time-entry';
import type { TimeEntryRow } from '@bookmatch/common/time/time-contract';
import type { Running } from '../punches/apply-punches';
import type { KeptPunch, PunchedWork, PunchIn, PunchOut } from '../punches/punch';

const id = (last: string): string => `01940000-0000-7000-8000-0000000000${last}`;
export const FRAMES = { entry: id('01'), job: id('a1'), operation: id('b1') };
export const BOXES = { entry: id('02'), job: id('a2'), operation: id('b2') };

export function buildWork(overrides: Partial<PunchedWork> = {}): PunchedWork {
  return {
    ...{ kind: 'work', jobId: FRAMES.job, jobNumber: 1042, jobTitle: 'Mudroom lockers' },
    ...{ operationId: FRAMES.operation, operationName: 'Face frames' },
    ...overrides,
  };
}

export const boxes = (): PunchedWork =>
  buildWork({
    ...{ jobId: BOXES.job, jobNumber: 1039, jobTitle: 'Kitchen, Alder Court' },
    ...{ operationId: BOXES.operation, operationName: 'Assemble boxes' },
  });

export function buildIn(overrides: Partial<PunchIn & KeptPunch> = {}): PunchIn & KeptPunch {
  return {
    ...{ type: 'in', order: 1, at: '2027-01-12T15:31:20.000Z', entryId: FRAMES.entry, work: buildWork() },
    ...{ source: 'phone', before: null, refused: null },
    ...overrides,
  };
}

export function buildOut(overrides: Partial<PunchOut & KeptPunch> = {}): PunchOut & KeptPunch {
  return {
    ...{ type: 'out', order: 2, at: '2027-01-12T17:45:59.000Z', entryId: FRAMES.entry, work: buildWork() },
    refused: null,
    ...overrides,
  };
}

export function buildChoice(overrides: Partial<ClockChoice> = {}): ClockChoice {
  return {
    ...{ jobId: FRAMES.job, jobNumber: 1042, jobTitle: 'Mudroom lockers' },
    ...{ operationId: FRAMES.operation, operationName: 'Face frames', minutesLeft: 144, recent: true },
    ...overrides,
  };
}

export const boxesChoice = (): ClockChoice =>
  buildChoice({
    ...{ jobId: BOXES.job, jobNumber: 1039, jobTitle: 'Kitchen, Alder Court' },
    ...{ operationId: BOXES.operation, operationName: 'Assemble boxes', minutesLeft: -30, recent: false },
  });

/** An entry on the face frames that is running since 9:31 am in Chicago. */
export function buildOpenEntry(overrides: Partial<TimeEntryRow> = {}): TimeEntryRow {
  return buildTimeEntryRow({
    ...{ id: FRAMES.entry, jobId: FRAMES.job, jobTitle: 'Mudroom lockers', operationId: FRAMES.operation },
    ...{ startedAt: '2027-01-12T15:31:00.000Z', endedAt: null },
    ...overrides,
  });
}

export function buildClock(overrides: Partial<ClockState> = {}): ClockState {
  return { open: null, todayMinutes: 0, choices: [buildChoice(), boxesChoice()], ...overrides };
}

export function buildRunning(overrides: Partial<Running> = {}): Running {
  return {
    ...{ entryId: FRAMES.entry, work: buildWork(), startedAt: '2027-01-12T15:31:00.000Z', kept: false },
    ...overrides,
  };
}

export function buildJobs(): ClockJobs {
  const planned = [{ operationId: FRAMES.operation, minutesLeft: 144 }];
  return {
    jobs: [
      { jobId: FRAMES.job, jobNumber: 1042, jobTitle: 'Mudroom lockers', planned },
      { jobId: BOXES.job, jobNumber: 1039, jobTitle: 'Kitchen, Alder Court', planned: [] },
    ],
    operations: [
      { operationId: BOXES.operation, operationName: 'Assemble boxes', onJob: true },
      { operationId: FRAMES.operation, operationName: 'Face frames', onJob: true },
      { operationId: id('b9'), operationName: 'Shop, not on a job', onJob: false },
    ],
  };
}
