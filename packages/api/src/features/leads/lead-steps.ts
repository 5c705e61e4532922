import { refuseLeadMove, type LeadMove } from '@bookmatch/common/leads/lead-stages';
import type { LeadStage } from '@bookmatch/common/leads/leads-contract';
import type { ShopScope } from '../../platform/database/scope.js';
import type { Patch } from '../../platform/database/shop-repository.js';
import { conflict, refuse } from '../../platform/http/problem-error.js';
import { LeadStageChange } from './lead-stage-change.entity.js';
import { Lead } from './lead.entity.js';

type Step = { to: LeadStage; by: LeadMove; patch?: Patch<Lead> };

/** Everything that changes a lead by somebody's hand stands in line here. @throws not-found, stale-version */
export async function lockLead(scope: ShopScope, id: string, version: number): Promise<Lead> {
  const leads = scope.rows(Lead);
  return leads.update(await leads.getForUpdate(id), {}, version);
}

/**
 * Takes a locked lead to another stage by the transition table and keeps who did it when.
 * @throws conflict when the table has no such step
 */
export async function stepLead(scope: ShopScope, lead: Lead, { to, by, patch = {} }: Step): Promise<Lead> {
  refuse(refuseLeadMove(lead.stage, to, by));
  const moved = await scope.rows(Lead).update(lead, { ...patch, stage: to, stageChangedAt: scope.now });
  await recordStage(scope, lead.id, lead.stage, to);
  return moved;
}

export async function recordStage(
  scope: ShopScope,
  leadId: string,
  fromStage: LeadStage | null,
  toStage: LeadStage,
): Promise<void> {
  const { author } = scope.stamp;
  await scope.rows(LeadStageChange).insert({
    id: scope.newId(),
    leadId,
    fromStage,
    toStage,
    memberId: author.kind === 'member' ? author.memberId : null,
  });
}

/** What a lead has no more once it is not lost. */
export const NOT_LOST = { lostReason: null, lostNote: '' } as const;

/**
 * The lead is won because its customer accepted an estimate, also after it was given up. A lead that is won stays as
 * it is, so that this may be called again.
 */
export async function markWon(scope: ShopScope, leadId: string): Promise<void> {
  const lead = await scope.rows(Lead).getForUpdate(leadId);
  if (lead.stage !== 'won') await stepLead(scope, lead, { to: 'won', by: 'win', patch: NOT_LOST });
}

/**
 * An estimate is started from the lead: it moves on to `estimating` and belongs to the estimate's customer from now on.
 * @throws not-found; conflict when the lead was lost or belongs to another customer
 */
export async function beginEstimating(scope: ShopScope, leadId: string, customerId: string): Promise<void> {
  const lead = await scope.rows(Lead).getForUpdate(leadId);
  if (lead.customerId !== null && lead.customerId !== customerId)
    throw conflict('This lead belongs to another customer.');
  if (lead.stage === 'lost') throw conflict('A lost lead has to be reopened first.');
  const patch = { customerId };
  if (lead.stage === 'won' || lead.stage === 'estimating') await scope.rows(Lead).update(lead, patch);
  else await stepLead(scope, lead, { to: 'estimating', by: 'move', patch });
}
