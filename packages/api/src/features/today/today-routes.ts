import { navCountsSchema } from '@bookmatch/common/today/nav-counts-contract';
import { quickFindQuerySchema, quickFindSchema } from '@bookmatch/common/today/quick-find-contract';
import { todaySchema } from '@bookmatch/common/today/today-contract';
import { shopRoute, type Route } from '../../platform/http/route.js';
import { navCounts } from './nav-counts.js';
import { quickFind } from './quick-find.js';
import { readToday } from './read-today.js';

/** Everybody of the shop may read some job, and what each role gets is its own. */
export function todayRoutes(): Route[] {
  return [
    shopRoute({
      method: 'get',
      path: '/today',
      summary: 'The first page of the one who asks',
      allow: ['read', 'Job'],
      answer: todaySchema,
      handle: ({ scope }) => readToday(scope),
    }),
    shopRoute({
      method: 'get',
      path: '/today/counts',
      summary: 'What waits for the one who asks',
      allow: ['read', 'Job'],
      answer: navCountsSchema,
      handle: ({ scope }) => navCounts(scope),
    }),
    shopRoute({
      method: 'get',
      path: '/find',
      summary: 'Find anything by its name or number',
      allow: ['read', 'Job'],
      query: quickFindQuerySchema,
      answer: quickFindSchema,
      handle: ({ scope, query }) => quickFind(scope, query.q),
    }),
  ];
}
