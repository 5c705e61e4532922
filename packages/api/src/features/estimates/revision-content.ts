import type { BillingShare, BillingStage } from '@bookmatch/common/estimates/billing-schedule-contract';
import type {
  EstimateLine as LineContent,
  EstimateRoom as RoomContent,
  RevisionContent,
} from '@bookmatch/common/estimates/revision-contract';
import type { ShopScope } from '../../platform/database/scope.js';
import { EstimateBillingStage } from './estimate-billing-stage.entity.js';
import { EstimateLine } from './estimate-line.entity.js';
import type { EstimateRevision } from './estimate-revision.entity.js';
import { EstimateRoom } from './estimate-room.entity.js';

export type RevisionRows = { rooms: EstimateRoom[]; lines: EstimateLine[]; stages: EstimateBillingStage[] };

/** The rows below a revision, each in its order. */
export async function loadRows(scope: ShopScope, revisionId: string): Promise<RevisionRows> {
  return {
    rooms: await scope.rows(EstimateRoom).findBy({ revisionId }, 'position'),
    lines: await scope.rows(EstimateLine).findBy({ revisionId }, 'position'),
    stages: await scope.rows(EstimateBillingStage).findBy({ revisionId }, 'position'),
  };
}

/** The revision as the rules take it. */
export async function loadContent(scope: ShopScope, revision: EstimateRevision): Promise<RevisionContent> {
  return contentOf(revision, await loadRows(scope, revision.id));
}

function contentOf(revision: EstimateRevision, { rooms, lines, stages }: RevisionRows): RevisionContent {
  return {
    validUntil: revision.validUntil,
    taxRule: revision.taxRule,
    taxRate: revision.taxRate,
    intro: revision.intro,
    terms: revision.terms,
    exclusions: revision.exclusions,
    discountCents: revision.discountCents,
    rooms: rooms.map((room) => roomOf(room, lines)),
    billingSchedule: stages.map(stageOf),
  };
}

function roomOf({ id, name }: EstimateRoom, lines: readonly EstimateLine[]): RoomContent {
  return { id, name, lines: lines.filter(({ roomId }) => roomId === id).map(lineOf) };
}

function lineOf(line: EstimateLine): LineContent {
  const {
    shopId: _shop,
    createdAt: _at,
    revisionId: _revision,
    roomId: _room,
    position: _place,
    ...rest
  } = line;
  return rest;
}

function stageOf({ id, name, deposit, due, ...stage }: EstimateBillingStage): BillingStage {
  return { id, name, share: shareOf(stage), deposit, due };
}

function shareOf({
  sharePercent,
  shareCents,
}: Pick<EstimateBillingStage, 'sharePercent' | 'shareCents'>): BillingShare {
  if (sharePercent !== null) return { percent: sharePercent };
  if (shareCents !== null) return { amountCents: shareCents };
  return { remainder: true };
}
