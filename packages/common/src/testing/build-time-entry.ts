import { elapsedMinutes } from '../time/punch.js';
import type { TimeEntry, TimeEntryRow } from '../time/time-contract.js';
import { nextId } from './ids.js';

/** Two hours and fourteen minutes of work on a job; pass `endedAt: null` for one that is open. */
export function buildTimeEntryRow(overrides: Partial<TimeEntryRow> = {}): TimeEntryRow {
  const startedAt = overrides.startedAt ?? '2027-01-12T15:31:00.000Z';
  const endedAt = overrides.endedAt === undefined ? '2027-01-12T17:45:00.000Z' : overrides.endedAt;
  return {
    id: nextId(),
    version: 1,
    memberId: nextId(),
    memberName: 'Ines Okafor',
    jobId: nextId(),
    jobNumber: 1042,
    jobTitle: 'Mudroom lockers and bench',
    operationId: nextId(),
    operationName: 'Face frames',
    kind: 'work',
    startedAt,
    endedAt,
    minutes: endedAt === null ? null : elapsedMinutes(startedAt, endedAt),
    note: '',
    source: 'phone',
    corrected: false,
    voidedAt: null,
    ...overrides,
  };
}

export function buildTimeEntry(overrides: Partial<TimeEntry> = {}): TimeEntry {
  return { ...buildTimeEntryRow(overrides), corrections: overrides.corrections ?? [] };
}
