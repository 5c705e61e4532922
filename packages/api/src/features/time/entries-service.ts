import { refuseOverlap, refuseTimes } from '@bookmatch/common/time/clock-rules';
import { punchMinute } from '@bookmatch/common/time/punch';
import type {
  AddTimeEntry,
  CorrectTimeEntry,
  TimeEntry as TimeEntryView,
  TimeEntryFacts,
} from '@bookmatch/common/time/time-contract';
import { refuseFacts } from '@bookmatch/common/time/work-rules';
import type { ShopScope } from '../../platform/database/scope.js';
import { conflict, notFound, refuse } from '../../platform/http/problem-error.js';
import { checkCorrectedWork } from './clocked-work.js';
import { measured } from './closed-entry.js';
import { corrected, factsOf, type StoredFacts } from './entry-facts.js';
import { viewEntryWithHistory } from './entry-view.js';
import { lockTimeOf, neighborsOf } from './member-time.js';
import { TimeCorrection } from './time-correction.entity.js';
import { TimeEntry } from './time-entry.entity.js';

/** Time put right afterwards: each change has a reason, and what stood there before is kept. */
export class EntriesService {
  async get(scope: ShopScope, id: string): Promise<TimeEntryView> {
    const entry = await scope.rows(TimeEntry).find(id);
    if (!entry) throw notFound('This time entry');
    scope.check('read', 'TimeEntry', entry);
    return viewEntryWithHistory(scope, id);
  }

  /** Enters a forgotten stretch, at what an hour of the member costs today. */
  async add(scope: ShopScope, input: AddTimeEntry): Promise<TimeEntryView> {
    const { memberId = scope.memberId, reason, ...typed } = input;
    scope.check('correct', 'TimeEntry', { memberId });
    const member = await lockTimeOf(scope, memberId);
    const facts = { ...typed, ...minutesOf(typed) };
    await this.checkFacts(scope, memberId, facts, []);
    await checkCorrectedWork(scope, facts);
    const { laborCostCentsPerHour } = member;
    const { id } = await scope.rows(TimeEntry).insert({
      ...{ ...facts, memberId, laborCostCentsPerHour, voidedAt: null, id: scope.newId() },
      ...{ source: 'correction', corrected: true, ...measured({ ...facts, laborCostCentsPerHour }) },
    });
    await this.keep(scope, id, reason, null, factsOf(facts));
    return viewEntryWithHistory(scope, id);
  }

  /** Changes what is named. Saving what stands there already changes nothing and leaves no trace. */
  async correct(
    scope: ShopScope,
    id: string,
    input: CorrectTimeEntry,
    version: number,
  ): Promise<TimeEntryView> {
    const entry = await this.lock(scope, id);
    const { reason, ...typed } = input;
    const before = factsOf(entry);
    const facts = corrected(entry, typed);
    const after = factsOf(facts);
    const changes = changedOf(before, after);
    if (changes.has('startedAt') || changes.has('endedAt') || changes.has('kind'))
      await this.checkFacts(scope, entry.memberId, facts, [id]);
    else refuse(refuseFacts(after));
    if (changes.has('jobId') || changes.has('operationId')) await checkCorrectedWork(scope, facts);
    const { laborCostCentsPerHour } = entry;
    await scope.rows(TimeEntry).update(
      entry,
      {
        ...facts,
        ...measured({ ...facts, laborCostCentsPerHour }),
        corrected: entry.corrected || changes.size > 0,
      },
      version,
    );
    if (changes.size > 0) await this.keep(scope, id, reason, before, after);
    return viewEntryWithHistory(scope, id);
  }

  /** Takes an entry out of every sum. It stays to be read. */
  async void(scope: ShopScope, id: string, reason: string, version: number): Promise<TimeEntryView> {
    const entry = await this.lock(scope, id);
    await scope.rows(TimeEntry).update(entry, { voidedAt: scope.now, corrected: true }, version);
    await this.keep(scope, id, reason, factsOf(entry), null);
    return viewEntryWithHistory(scope, id);
  }

  /** The entry, with all time of its member locked. */
  private async lock(scope: ShopScope, id: string): Promise<TimeEntry> {
    const found = await scope.rows(TimeEntry).find(id);
    if (!found) throw notFound('This time entry');
    scope.check('correct', 'TimeEntry', found);
    await lockTimeOf(scope, found.memberId);
    const entry = await scope.rows(TimeEntry).getForUpdate(id);
    if (entry.voidedAt !== null) throw conflict('This entry was voided. Add a new one instead.');
    return entry;
  }

  private async checkFacts(
    scope: ShopScope,
    memberId: string,
    facts: StoredFacts,
    except: readonly string[],
  ): Promise<void> {
    const plain = factsOf(facts);
    refuse(refuseFacts(plain) ?? refuseTimes(plain, scope.now.toISOString()));
    const others = await neighborsOf(scope, memberId, { from: facts.startedAt, to: facts.endedAt, except });
    refuse(refuseOverlap(plain, others));
  }

  private async keep(
    scope: ShopScope,
    entryId: string,
    reason: string,
    before: TimeEntryFacts | null,
    after: TimeEntryFacts | null,
  ): Promise<void> {
    const row = { id: scope.newId(), entryId, memberId: scope.memberId, reason, before, after };
    await scope.rows(TimeCorrection).insert(row);
  }
}

function minutesOf({ startedAt, endedAt }: { startedAt: string; endedAt: string }) {
  return { startedAt: new Date(punchMinute(startedAt)), endedAt: new Date(punchMinute(endedAt)) };
}

function changedOf(before: TimeEntryFacts, after: TimeEntryFacts): Set<keyof TimeEntryFacts> {
  const keys = Object.keys(before) as (keyof TimeEntryFacts)[];
  return new Set(keys.filter((key) => before[key] !== after[key]));
}
