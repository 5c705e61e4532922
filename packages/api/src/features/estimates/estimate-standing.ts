import { addDays, startOfDay } from '@bookmatch/common/calendar/shop-dates';
import { estimateStatus } from '@bookmatch/common/estimates/revision-stages';
import type { ShopScope } from '../../platform/database/scope.js';
import { EstimateRevision } from './estimate-revision.entity.js';
import { Estimate } from './estimate.entity.js';

/** The accepted revision, or else the newest. Revisions come oldest first. */
export function currentOf(revisions: readonly EstimateRevision[]): EstimateRevision {
  const current = revisions.find(({ status }) => status === 'accepted') ?? revisions.at(-1);
  if (!current) throw new TypeError('An estimate has at least one revision.');
  return current;
}

/** What the customer sees: the accepted revision, or the sent one, or the newest that ever was sent; or none yet. */
export function shownOf(revisions: readonly EstimateRevision[]): EstimateRevision | undefined {
  return (
    revisions.find(({ status }) => status === 'accepted') ??
    revisions.find(({ status }) => status === 'sent') ??
    revisions.findLast(({ status }) => status !== 'draft')
  );
}

/** Writes on the estimate what lists tell it by, after one of its revisions changed. */
export async function updateStanding(scope: ShopScope, estimate: Estimate, zone: string): Promise<Estimate> {
  const revisions = await revisionsOf(scope, estimate.id);
  // Stored is what does not pass with time alone: on its last day a sent estimate is still just sent.
  const status = estimateStatus(revisions, '0000-01-01');
  if (status === 'expired') throw new TypeError('No date has passed before the first one.');
  const sent = revisions.find((revision) => revision.status === 'sent');
  return scope.rows(Estimate).update(estimate, {
    status,
    openUntil: sent ? new Date(startOfDay(zone, addDays(sent.validUntil, 1))) : null,
    currentRevisionNumber: currentOf(revisions).number,
  });
}

/** Oldest first. */
export function revisionsOf(scope: ShopScope, estimateId: string): Promise<EstimateRevision[]> {
  return scope.rows(EstimateRevision).findBy({ estimateId }, 'number', true);
}
