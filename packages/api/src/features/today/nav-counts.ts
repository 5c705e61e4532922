import type { NavCounts } from '@bookmatch/common/today/nav-counts-contract';
import type { ShopScope } from '../../platform/database/scope.js';
import { countOpenQuestions } from '../estimates/estimates-public.js';
import { countOverdue } from '../invoices/invoices-public.js';
import { countLeadsDue } from '../leads/leads-public.js';
import { todayOf } from '../shops/shops-public.js';

/** What waits for the one who asks, from indexes alone: it is asked for again and again while they work. */
export async function navCounts(scope: ShopScope): Promise<NavCounts> {
  const today = await todayOf(scope);
  return {
    ...(scope.can('update', 'Lead') ? { leads: await countLeadsDue(scope, today) } : {}),
    ...(scope.can('update', 'Estimate') ? { estimates: await countOpenQuestions(scope) } : {}),
    ...(scope.can('read', 'Invoice') ? { invoices: await countOverdue(scope, today) } : {}),
  };
}
