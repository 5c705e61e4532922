import type { TimeKind } from '@bookmatch/common/time/time-contract';
import type { ShopScope } from '../../platform/database/scope.js';
import { entryQuery, type StoredEntry } from './entry-rows.js';

export type ClockedIn = {
  memberId: string;
  memberName: string;
  kind: TimeKind;
  jobId: string | null;
  jobNumber: number | null;
  jobTitle: string | null;
  operationName: string | null;
  startedAt: string;
};

/** Everybody who is clocked in at this moment, the longest first. For those who may read everybody's time. */
export async function onTheClock(scope: ShopScope): Promise<ClockedIn[]> {
  const rows = await entryQuery(scope)
    .where('entry.openMemberId is not null')
    .orderBy('entry.startedAt')
    .all<StoredEntry>();
  return rows.map(({ memberId, memberName, kind, jobId, jobNumber, jobTitle, operationName, startedAt }) => ({
    ...{ memberId, memberName, kind, jobId, jobNumber, jobTitle, operationName },
    startedAt: startedAt.toISOString(),
  }));
}
