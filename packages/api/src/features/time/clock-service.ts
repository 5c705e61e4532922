import type { Punched } from '@bookmatch/common/time/clock-contract';
import { refuseClockIn, refuseClockOut, type Span } from '@bookmatch/common/time/clock-rules';
import { punchMinute } from '@bookmatch/common/time/punch';
import type { ClockIn, ClockOut } from '@bookmatch/common/time/time-contract';
import type { ShopScope } from '../../platform/database/scope.js';
import { conflict, notAllowed, notFound, refuse } from '../../platform/http/problem-error.js';
import { clockStateOf } from './clock-state.js';
import { checkNewWork } from './clocked-work.js';
import { measured } from './closed-entry.js';
import { entryQuery, viewEntry, type StoredEntry } from './entry-rows.js';
import { lockTimeOf, neighborsOf, openEntryOf, spanOf } from './member-time.js';
import { TimeEntry } from './time-entry.entity.js';

/**
 * The clock of the one who punches it. A punch carries its own instant, which may lie in the past, and happens once
 * however often it is sent.
 */
export class ClockService {
  /** Clocks in, or switches: an open entry is closed at the same instant. */
  async clockIn(scope: ShopScope, punch: ClockIn): Promise<Punched> {
    return answer(scope, await this.punchIn(scope, punch));
  }

  /** Closes an entry. One that is closed already, by whatever came first, stays as it is. */
  async clockOut(scope: ShopScope, entryId: string, punch: ClockOut): Promise<Punched> {
    return answer(scope, await this.punchOut(scope, entryId, punch));
  }

  /** The punch alone, for work that does not look at the clock afterwards. Answers the entry's id. */
  async punchIn(scope: ShopScope, punch: ClockIn): Promise<string> {
    const member = await lockTimeOf(scope, scope.memberId);
    // Who was removed while the punch waited was clocked out by that, and could never end what begins now.
    if (member.removedAt !== null) throw notFound();
    const known = await scope.rows(TimeEntry).find(punch.entryId);
    if (known) return own(scope, known).id;

    const at = punchMinute(punch.at);
    const open = await openEntryOf(scope, member.id);
    refuse(refuseClockIn(at, now(scope), open && spanOf(open), await around(scope, open, at)));
    await checkNewWork(scope, punch);
    if (open) await this.close(scope, open, at);
    const { jobId, operationId, kind, source, note } = punch;
    await scope.rows(TimeEntry).insert({
      ...{ id: punch.entryId, memberId: member.id, jobId, operationId, kind, source, note },
      ...{ startedAt: new Date(at), endedAt: null, minutes: null, corrected: false, voidedAt: null },
      ...{ laborCostCentsPerHour: member.laborCostCentsPerHour, costCents: null },
    });
    return punch.entryId;
  }

  /** The same for the end. */
  async punchOut(scope: ShopScope, entryId: string, punch: ClockOut): Promise<string> {
    await lockTimeOf(scope, scope.memberId);
    const entry = own(scope, await this.punched(scope, entryId));
    if (entry.endedAt === null && entry.voidedAt === null) {
      const at = punchMinute(punch.at);
      refuse(refuseClockOut(at, now(scope), spanOf(entry), await around(scope, entry, at)));
      await this.close(scope, entry, at, punch.note);
    }
    return entryId;
  }

  private async punched(scope: ShopScope, entryId: string): Promise<TimeEntry> {
    const entry = await scope.rows(TimeEntry).find(entryId);
    if (!entry) throw notFound('This time entry');
    return entry;
  }

  private async close(scope: ShopScope, entry: TimeEntry, at: string, note?: string): Promise<void> {
    const endedAt = new Date(at);
    await scope.rows(TimeEntry).update(entry, {
      endedAt,
      ...measured({ ...entry, endedAt }),
      ...(note ? { note } : {}),
    });
  }
}

/** Nobody punches for somebody else: that is a correction, and needs a reason. */
function own(scope: ShopScope, entry: TimeEntry): TimeEntry {
  scope.check('read', 'TimeEntry', entry);
  if (entry.memberId !== scope.memberId)
    throw notAllowed('This is the time of somebody else. Correct it with a reason instead.');
  return entry;
}

/** What the member clocked besides the open entry, from its start, or from the punch, up to the punch. */
function around(scope: ShopScope, open: TimeEntry | null, at: string): Promise<Span[]> {
  const to = new Date(at);
  const from = open && open.startedAt < to ? open.startedAt : to;
  return neighborsOf(scope, scope.memberId, { from, to, except: open ? [open.id] : [] });
}

async function answer(scope: ShopScope, entryId: string): Promise<Punched> {
  const row = await entryQuery(scope).where('entry.id = :entryId', { entryId }).first<StoredEntry>();
  if (!row) throw conflict('This time entry was taken away meanwhile.');
  return { entry: viewEntry(row), clock: await clockStateOf(scope) };
}

const now = (scope: ShopScope): string => scope.now.toISOString();
