import { MAX_ENTRY_MINUTES } from '@bookmatch/common/time/clock-rules';
import { punchMinute } from '@bookmatch/common/time/punch';
import type { ShopScope } from '../../platform/database/scope.js';
import { measured } from './closed-entry.js';
import { lockTimeOf, openEntryOf } from './member-time.js';
import { TimeEntry } from './time-entry.entity.js';

const MINUTE_MS = 60_000;

/**
 * Ends what somebody is clocked in to in the minute they leave the shop, since they can no longer do it themselves. An
 * entry forgotten for longer than one may last ends where it would have had to; both can be corrected with a reason.
 */
export async function clockOutLeaver(scope: ShopScope, memberId: string): Promise<void> {
  await lockTimeOf(scope, memberId);
  const entry = await openEntryOf(scope, memberId);
  if (!entry) return;
  const left = Date.parse(punchMinute(scope.now.toISOString()));
  const begun = entry.startedAt.getTime();
  if (left <= begun) {
    await scope.rows(TimeEntry).update(entry, { voidedAt: scope.now });
    return;
  }
  const endedAt = new Date(Math.min(left, begun + MAX_ENTRY_MINUTES * MINUTE_MS));
  await scope.rows(TimeEntry).update(entry, { endedAt, ...measured({ ...entry, endedAt }) });
}
