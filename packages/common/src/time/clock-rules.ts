import type { InstantText } from '../calendar/shop-dates.js';
import type { Refusal } from '../problems/problem.js';
import { elapsedMinutes } from './punch.js';

/** A phone's clock may run ahead of the server's by this much. */
export const FUTURE_TOLERANCE_MINUTES = 5;
/** Longer than this, somebody forgot to clock out; the true end has to be said. */
export const MAX_ENTRY_MINUTES = 16 * 60;

export type Span = { startedAt: InstantText; endedAt: InstantText | null };

/** Why these times cannot be, or null. An entry that ends the minute it starts is allowed: it counts nothing. */
export function refuseTimes({ startedAt, endedAt }: Span, now: InstantText): Refusal | null {
  if (isFuture(startedAt, now)) return refusal('startedAt', 'This starts in the future.');
  if (endedAt === null) return null;
  if (isFuture(endedAt, now)) return refusal('endedAt', 'This ends in the future.');
  const minutes = elapsedMinutes(startedAt, endedAt);
  if (minutes < 0) return refusal('endedAt', 'This ends before it starts.');
  if (minutes > MAX_ENTRY_MINUTES)
    return refusal('endedAt', 'This is longer than 16 hours. Say when the work really stopped.');
  return null;
}

/** Why a stretch cannot stand beside the member's other entries (voided ones left out), or null. */
export function refuseOverlap(span: Span, others: readonly Span[]): Refusal | null {
  return others.some((other) => overlaps(span, other))
    ? refusal('startedAt', 'This overlaps with other time of the same member.')
    : null;
}

/**
 * Why a member cannot clock in at an instant, or null. While an entry is open this is a switch, which closes it at the
 * same instant, so it must be able to close there.
 */
export function refuseClockIn(
  at: InstantText,
  now: InstantText,
  open: Span | null,
  others: readonly Span[],
): Refusal | null {
  const start: Span = { startedAt: at, endedAt: null };
  return (
    atField(refuseTimes(start, now)) ??
    (open && refuseClockOut(at, now, open, others)) ??
    atField(refuseOverlap({ startedAt: at, endedAt: at }, others))
  );
}

/**
 * Why an open entry cannot be closed at an instant, or null. Time that was entered into its course meanwhile, on another
 * device or by a correction, has to lie after it.
 */
export function refuseClockOut(
  at: InstantText,
  now: InstantText,
  open: Span,
  others: readonly Span[] = [],
): Refusal | null {
  const closed: Span = { startedAt: open.startedAt, endedAt: at };
  return atField(refuseTimes(closed, now) ?? refuseOverlap(closed, others));
}

/** Two stretches that touch do not overlap; an open one reaches on without end. */
export function overlaps(a: Span, b: Span): boolean {
  const [startA, endA] = bounds(a);
  const [startB, endB] = bounds(b);
  if (startA === endA) return startB < startA && startA < endB;
  if (startB === endB) return startA < startB && startB < endA;
  return startA < endB && startB < endA;
}

function bounds({ startedAt, endedAt }: Span): [number, number] {
  return [Date.parse(startedAt), endedAt === null ? Number.POSITIVE_INFINITY : Date.parse(endedAt)];
}

function isFuture(instant: InstantText, now: InstantText): boolean {
  return Date.parse(instant) > Date.parse(now) + FUTURE_TOLERANCE_MINUTES * 60_000;
}

/** A punch has one instant, `at`, whichever end of an entry it makes. */
function atField(found: Refusal | null): Refusal | null {
  return found && { ...found, fields: [{ path: 'at', message: found.detail }] };
}

function refusal(path: string, detail: string): Refusal {
  return { code: 'conflict', detail, fields: [{ path, message: detail }] };
}
