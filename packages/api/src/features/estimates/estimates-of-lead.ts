import type { ShopScope } from '../../platform/database/scope.js';
import { Estimate } from './estimate.entity.js';

/** The estimates that were started from a lead, by number. */
export async function estimatesOfLead(
  scope: ShopScope,
  leadId: string,
): Promise<{ id: string; number: number; title: string }[]> {
  const estimates = await scope.rows(Estimate).findBy({ leadId }, 'number');
  return estimates.map(({ id, number, title }) => ({ id, number, title }));
}
