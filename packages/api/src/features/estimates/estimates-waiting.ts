import type { EstimateRow } from '@bookmatch/common/estimates/estimates-contract';
import type { ShopScope } from '../../platform/database/scope.js';
import { EstimateQuestion } from './estimate-question.entity.js';
import { estimateRows, viewEstimateRow, type StoredEstimateRow } from './estimate-lists.js';
import { Estimate } from './estimate.entity.js';

type Stored = StoredEstimateRow & { inAll: number | string };
const IS_ASKED =
  'exists (select 1 from estimate_question asked where asked.shop_id = estimate.shop_id and asked.estimate_id = estimate.id and asked.answer is null)';

/**
 * The estimates that wait for an answer, and how many there are in all: first those whose customer waits for ours,
 * then those that were sent and are still valid, the oldest first.
 */
export async function estimatesWaiting(
  scope: ShopScope,
  limit: number,
): Promise<{ count: number; rows: EstimateRow[] }> {
  const rows = await estimateRows(scope)
    .pick({ inAll: 'count(*) over ()' })
    .where("estimate.status in ('draft', 'sent')")
    .where(`(estimate.status = 'sent' and estimate.openUntil > :now) or ${IS_ASKED}`, { now: scope.now })
    .orderBy(`case when ${IS_ASKED} then 0 else 1 end`)
    .orderBy('revision.sentAt')
    .orderBy('estimate.id')
    .limit(limit)
    .all<Stored>();
  return {
    count: Number(rows[0]?.inAll ?? 0),
    rows: rows.map(({ inAll: _inAll, ...row }) => viewEstimateRow(row, scope.now)),
  };
}

/** Customers' questions without an answer, about estimates that are not settled. */
export function countOpenQuestions(scope: ShopScope): Promise<number> {
  return scope
    .query(Estimate, 'estimate')
    .join(EstimateQuestion, 'question', 'question.estimateId = estimate.id')
    .where("estimate.status in ('draft', 'sent') and question.answer is null")
    .count();
}
