import { billScheduleSoFar } from '@bookmatch/common/estimates/billing-schedule';
import type { BilledStage, BillingShare } from '@bookmatch/common/estimates/billing-schedule-contract';
import { estimateTotals } from '@bookmatch/common/estimates/estimate-totals';
import type {
  EstimateRoom as RoomContent,
  RevisionContent,
} from '@bookmatch/common/estimates/revision-contract';
import type { ShopScope } from '../../platform/database/scope.js';
import type { NewRow } from '../../platform/database/shop-repository.js';
import { isDuplicateKey } from '../../platform/database/retry.js';
import { invalid } from '../../platform/http/problem-error.js';
import { EstimateBillingStage } from './estimate-billing-stage.entity.js';
import { EstimateLine } from './estimate-line.entity.js';
import { EstimateRevision } from './estimate-revision.entity.js';
import { EstimateRoom } from './estimate-room.entity.js';
import { refuseUnknownOperations } from './line-operations.js';
import { putRows, removeRows } from './put-rows.js';
import { loadRows } from './revision-content.js';

/** What of the content stands on the revision's own row, with what the rules make of the whole. */
export function revisionColumns(content: RevisionContent) {
  const { rooms: _rooms, billingSchedule: _schedule, ...head } = content;
  const { netCents, taxCents, totalCents, plannedCostCents } = estimateTotals(content);
  return { ...head, netCents, taxCents, totalCents, plannedCostCents };
}

/**
 * Puts the content in the place of what the draft had. Rooms, lines and stages keep their rows by their ids, so that
 * only what differs is written.
 *
 * @param version the revision's version that the person saw
 * @throws stale-version; invalid-input for an operation of nobody's or an id that is taken
 */
export async function saveContent(
  scope: ShopScope,
  revision: EstimateRevision,
  content: RevisionContent,
  version: number,
): Promise<EstimateRevision> {
  const revisions = scope.rows(EstimateRevision);
  await revisions.update(revision, {}, version);
  await refuseUnknownOperations(scope, content.rooms);
  const rowsChanged = await saveRows(scope, revision.id, content);
  const patch = revisionColumns(content);
  return revisions.update(revision, rowsChanged ? { ...patch, savedAt: scope.now } : patch, version);
}

/** Answers whether anything was written. */
export async function saveRows(
  scope: ShopScope,
  revisionId: string,
  content: RevisionContent,
): Promise<boolean> {
  const stored = await loadRows(scope, revisionId);
  try {
    const rooms = await putRows(scope.rows(EstimateRoom), stored.rooms, roomRows(revisionId, content.rooms));
    const lines = await putRows(scope.rows(EstimateLine), stored.lines, lineRows(revisionId, content.rooms));
    const stages = await putRows(
      scope.rows(EstimateBillingStage),
      stored.stages,
      stageRows(revisionId, billScheduleSoFar(content.billingSchedule, estimateTotals(content))),
    );
    // Lines before the rooms they point at.
    await removeRows(scope.rows(EstimateLine), lines.left);
    await removeRows(scope.rows(EstimateRoom), rooms.left);
    await removeRows(scope.rows(EstimateBillingStage), stages.left);
    return [rooms, lines, stages].some(({ written, left }) => written > 0 || left.length > 0);
  } catch (error) {
    if (isDuplicateKey(error))
      throw invalid('rooms', 'A room, line or stage has an id that is in use elsewhere.');
    throw error;
  }
}

function roomRows(revisionId: string, rooms: readonly RoomContent[]): NewRow<EstimateRoom>[] {
  return rooms.map(({ id, name }, position) => ({ id, revisionId, position, name }));
}

function lineRows(revisionId: string, rooms: readonly RoomContent[]): NewRow<EstimateLine>[] {
  return rooms.flatMap((room) =>
    room.lines.map((line, position) => ({ ...line, revisionId, roomId: room.id, position })),
  );
}

function stageRows(revisionId: string, stages: readonly BilledStage[]): NewRow<EstimateBillingStage>[] {
  return stages.map(({ share, ...stage }, position) => ({
    ...stage,
    ...shareColumns(share),
    revisionId,
    position,
  }));
}

function shareColumns(share: BillingShare) {
  return {
    sharePercent: 'percent' in share ? share.percent : null,
    shareCents: 'amountCents' in share ? share.amountCents : null,
  };
}
