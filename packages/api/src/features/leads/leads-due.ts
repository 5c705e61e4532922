import { OPEN_LEAD_STAGES, type LeadRow, type OpenLeadStage } from '@bookmatch/common/leads/leads-contract';
import type { ShopScope } from '../../platform/database/scope.js';
import { IS_OPEN } from './lead-filters.js';
import { leadRows, viewLeadRow, type StoredLeadRow } from './lead-lists.js';
import { Lead } from './lead.entity.js';

const IS_DUE = `${IS_OPEN} and lead.nextStepOrder <= :today`;

/**
 * The open leads whose next step is due, the oldest first, and how many there are in all.
 * @param today the date in the shop's zone
 */
export async function leadsDue(
  scope: ShopScope,
  today: string,
  limit: number,
): Promise<{ count: number; rows: LeadRow[] }> {
  const rows = await leadRows(scope)
    .pick({ inAll: 'count(*) over ()' })
    .where(IS_DUE, { today })
    .orderBy('lead.nextStepOrder')
    .orderBy('lead.id')
    .limit(limit)
    .all<StoredLeadRow & { inAll: number | string }>();
  return {
    count: Number(rows[0]?.inAll ?? 0),
    rows: rows.map(({ inAll: _inAll, ...row }) => viewLeadRow(row)),
  };
}

export function countLeadsDue(scope: ShopScope, today: string): Promise<number> {
  return scope.query(Lead, 'lead').where(IS_DUE, { today }).count();
}

/** How many leads stand at each open stage, in the order of the stages. */
export async function openLeadsByStage(scope: ShopScope): Promise<{ stage: OpenLeadStage; count: number }[]> {
  const counts = await scope
    .query(Lead, 'lead')
    .pick({ stage: 'lead.stage', count: 'count(*)' })
    .where(IS_OPEN)
    .groupBy('lead.stage')
    .all<{ stage: string; count: number | string }>();
  return OPEN_LEAD_STAGES.map((stage) => ({
    stage,
    count: Number(counts.find((row) => row.stage === stage)?.count ?? 0),
  }));
}
