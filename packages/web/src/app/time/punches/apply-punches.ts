import { dateIn, type InstantText } from '@bookmatch/common/calendar/shop-dates';
import type { ClockState } from '@bookmatch/common/time/clock-contract';
import { elapsedMinutes, punchMinute } from '@bookmatch/common/time/punch';
import { splitByDay } from '@bookmatch/common/time/shop-week';
import type { KeptPunch, PunchedWork } from './punch';

export type Running = {
  entryId: string;
  work: PunchedWork;
  startedAt: InstantText;
  /** The server does not know of it yet. */
  kept: boolean;
};
type Closed = { work: PunchedWork; startedAt: InstantText; endedAt: InstantText };
export type Clock = { running: Running | null; closed: Closed[] };

/**
 * The clock as the person knows it: what the server said last, with the punches on it that it was not told of yet.
 * A refused punch changes nothing; the person has to settle it.
 *
 * @returns `closed`: what the kept punches closed and the server's sums do not hold yet
 */
export function applyPunches(server: ClockState | null, punches: readonly KeptPunch[]): Clock {
  const start: Clock = { running: runningOf(server), closed: [] };
  return punches.filter((punch) => punch.refused === null).reduce(apply, start);
}

/** Work of today on the wall of the shop, what is running included. */
export function workToday(
  server: ClockState | null,
  { running, closed }: Clock,
  now: InstantText,
  zone: string,
): number {
  const today = dateIn(zone, now);
  const stretches = running ? [...closed, { ...running, endedAt: now }] : closed;
  const added = stretches
    .filter(({ work }) => work.kind === 'work')
    .flatMap(({ startedAt, endedAt }) => (startedAt < endedAt ? splitByDay(startedAt, endedAt, zone) : []))
    .filter((part) => part.on === today)
    .reduce((sum, part) => sum + part.minutes, 0);
  return (server?.todayMinutes ?? 0) + added;
}

export function runningMinutes({ startedAt }: Running, now: InstantText): number {
  return Math.max(0, elapsedMinutes(startedAt, now));
}

function apply(clock: Clock, punch: KeptPunch): Clock {
  const { running } = clock;
  const at = punchMinute(punch.at);
  if (punch.type === 'out')
    return running?.entryId === punch.entryId ? { running: null, closed: close(clock, at) } : clock;
  if (running?.entryId === punch.entryId) return clock;
  const { entryId, work } = punch;
  return { running: { entryId, work, startedAt: at, kept: true }, closed: close(clock, at) };
}

function close({ running, closed }: Clock, endedAt: InstantText): Closed[] {
  return running ? [...closed, { work: running.work, startedAt: running.startedAt, endedAt }] : closed;
}

function runningOf(server: ClockState | null): Running | null {
  if (!server?.open) return null;
  const { id, startedAt, kind, jobId, jobNumber, jobTitle, operationId, operationName } = server.open;
  const work = { kind, jobId, jobNumber, jobTitle, operationId, operationName };
  return { entryId: id, work, startedAt, kept: false };
}
