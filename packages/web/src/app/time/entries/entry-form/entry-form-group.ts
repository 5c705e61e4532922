import type { NonNullableFormBuilder } from '@angular/forms';
import { addDays, dateIn } from '@bookmatch/common/calendar/shop-dates';
import type {
  AddTimeEntry,
  CorrectTimeEntry,
  TimeEntryRow,
  TimeKind,
} from '@bookmatch/common/time/time-contract';
import { instantOnWall, wallTime } from '@bookmatch/common/time/wall-time';

/** What is typed about an entry: times as the clock on the shop's wall shows them. Empty for no job. */
export type TypedEntry = {
  kind: TimeKind;
  jobId: string;
  operationId: string;
  on: string;
  from: string;
  to: string;
  note: string;
  reason: string;
};

export function entryFormGroup(builder: NonNullableFormBuilder, typed: TypedEntry) {
  return builder.group({
    kind: builder.control<TimeKind>(typed.kind),
    jobId: typed.jobId,
    operationId: typed.operationId,
    on: typed.on,
    from: typed.from,
    to: typed.to,
    note: typed.note,
    reason: typed.reason,
  });
}

export function typedOf(entry: TimeEntryRow | null, on: string, zone: string): TypedEntry {
  if (!entry) return { kind: 'work', jobId: '', operationId: '', on, from: '', to: '', note: '', reason: '' };
  const { kind, jobId, operationId, startedAt, endedAt, note } = entry;
  return {
    ...{ kind, jobId: jobId ?? '', operationId: operationId ?? '', note, reason: '' },
    ...{ on: dateIn(zone, startedAt), from: wallTime(zone, startedAt) },
    to: endedAt === null ? '' : wallTime(zone, endedAt),
  };
}

/** The instants that were typed. An end that is earlier on the wall than the start is of the next day. */
export function instantsOf({ on, from, to }: TypedEntry, zone: string) {
  const startedAt = instantOnWall(zone, on, from);
  const endsOn = on && to && to < from ? addDays(on, 1) : on;
  return { startedAt, endedAt: instantOnWall(zone, endsOn, to) };
}

type Missing = { path: keyof TypedEntry; message: string };

/** What has to be typed before anything can be sent. An entry may stay open when it was. */
export function missingIn(typed: TypedEntry, zone: string, mayStayOpen: boolean): Missing[] {
  const { startedAt, endedAt } = instantsOf(typed, zone);
  const missing: Missing[] = [];
  if (!typed.on) missing.push({ path: 'on', message: 'Give the day.' });
  if (!typed.from || (typed.on && !startedAt))
    missing.push({ path: 'from', message: 'Give the time of day.' });
  const end = typed.to ? (typed.on && !endedAt ? 'Give the time of day.' : '') : 'Say when it ended.';
  if (end && !(mayStayOpen && !typed.to)) missing.push({ path: 'to', message: end });
  if (typed.kind === 'work' && !typed.operationId)
    missing.push({ path: 'operationId', message: 'Choose an operation.' });
  if (!typed.reason.trim()) missing.push({ path: 'reason', message: 'Say why, in a few words.' });
  return missing;
}

export function addedFields(typed: TypedEntry, memberId: string, zone: string): AddTimeEntry {
  const { startedAt, endedAt } = instantsOf(typed, zone);
  const { kind, note, reason } = typed;
  return {
    ...{ memberId, kind, note: note.trim(), reason: reason.trim(), ...workOf(typed) },
    startedAt: startedAt ?? '',
    endedAt: endedAt ?? '',
  };
}

/**
 * Only what was changed. A time that still reads the same is not sent: in the hour that the clocks repeat in fall the
 * wall shows two instants alike.
 */
export function correctedFields(typed: TypedEntry, entry: TimeEntryRow, zone: string): CorrectTimeEntry {
  const before = typedOf(entry, '', zone);
  const { startedAt, endedAt } = instantsOf(typed, zone);
  const work = workOf(typed);
  const dayMoved = typed.on !== before.on;
  return {
    reason: typed.reason.trim(),
    ...(typed.kind === entry.kind ? {} : { kind: typed.kind }),
    ...(work.jobId === entry.jobId ? {} : { jobId: work.jobId }),
    ...(work.operationId === entry.operationId ? {} : { operationId: work.operationId }),
    ...(startedAt && (dayMoved || typed.from !== before.from) ? { startedAt } : {}),
    ...(endedAt && (dayMoved || typed.to !== before.to) ? { endedAt } : {}),
    ...(typed.note.trim() === entry.note ? {} : { note: typed.note.trim() }),
  };
}

function workOf({ kind, jobId, operationId }: TypedEntry) {
  return kind === 'meal-break'
    ? { jobId: null, operationId: null }
    : { jobId: jobId || null, operationId: operationId || null };
}
