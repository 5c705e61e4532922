import { OPEN_LEAD_STAGES, type LeadListQuery } from '@bookmatch/common/leads/leads-contract';
import type { ShopScope } from '../../platform/database/scope.js';
import { likePattern } from '../../platform/http/keyset.js';
import { todayOf } from '../shops/shops-public.js';

/** Conditions on rows beside the alias `lead`, each with the values it names. */
export type Conditions = { sql: string; parameters: Record<string, unknown> }[];

/** SQL: something has to be done about the lead. */
export const IS_OPEN = `lead.stage in (${OPEN_LEAD_STAGES.map((stage) => `'${stage}'`).join(', ')})`;

/** What a list, its file and the board have in common. Days are the shop's. */
export async function leadConditions(
  scope: ShopScope,
  { stage, source, nextStep, q }: Pick<LeadListQuery, 'stage' | 'source' | 'nextStep' | 'q'>,
): Promise<Conditions> {
  const conditions: Conditions = [];
  const add = (sql: string, parameters = {}) => conditions.push({ sql, parameters });
  if (stage === 'open') add(IS_OPEN);
  else if (stage) add('lead.stage = :stage', { stage });
  if (source) add('lead.source = :source', { source });
  if (nextStep === 'none') add(`${IS_OPEN} and lead.nextStepOn is null`);
  else if (nextStep) add(dueBy(nextStep), { today: await todayOf(scope) });
  if (q) add(TEXT, { q: likePattern(q) });
  return conditions;
}

const dueBy = (nextStep: 'overdue' | 'due') =>
  `${IS_OPEN} and lead.nextStepOrder ${nextStep === 'overdue' ? '<' : '<='} :today`;
const TEXT =
  'lead.title like :q or lead.contactName like :q or lead.company like :q or lead.email like :q or lead.phone like :q';
