import { billSchedule } from '@bookmatch/common/estimates/billing-schedule';
import { estimateTotals } from '@bookmatch/common/estimates/estimate-totals';
import { planWork } from '@bookmatch/common/estimates/planned-work';
import type { ShopScope } from '../../platform/database/scope.js';
import type { AcceptedEstimate } from './accepted-estimate.js';
import type { EstimateAcceptance } from './estimate-acceptance.entity.js';
import type { EstimateRevision } from './estimate-revision.entity.js';
import type { Estimate } from './estimate.entity.js';
import { loadContent } from './revision-content.js';

/** What the slices above take over, computed from the accepted content. */
export async function acceptedEstimate(
  scope: ShopScope,
  { id, number, title, customerId, siteId, leadId }: Estimate,
  revision: EstimateRevision,
  acceptance: EstimateAcceptance,
): Promise<AcceptedEstimate> {
  const content = await loadContent(scope, revision);
  const totals = estimateTotals(content);
  return {
    estimate: { id, number, title, customerId, siteId, leadId },
    revision: {
      id: revision.id,
      number: revision.number,
      taxRule: content.taxRule,
      taxRate: content.taxRate,
      netCents: totals.netCents,
      taxCents: totals.taxCents,
      totalCents: totals.totalCents,
      plannedCostCents: totals.plannedCostCents,
      plannedCostByCategory: totals.plannedCostByCategory,
      plannedWork: planWork(content.rooms.flatMap((room) => room.lines)),
      billingSchedule: billSchedule(content.billingSchedule, totals),
    },
    acceptance: { id: acceptance.id, acceptedAt: acceptance.createdAt, name: acceptance.name },
  };
}
