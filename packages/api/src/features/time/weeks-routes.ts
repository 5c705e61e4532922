import { memberWeekSchema, shopWeekSchema, weekQuerySchema } from '@bookmatch/common/time/week-contract';
import { shopRoute, type Route } from '../../platform/http/route.js';
import { exportWeek } from './week-export.js';
import { memberWeek, shopWeek } from './weeks.js';

export function weeksRoutes(): Route[] {
  return [
    shopRoute({
      method: 'get',
      path: '/time/week',
      summary: "One's own week",
      allow: ['read', 'TimeEntry'],
      query: weekQuerySchema,
      answer: memberWeekSchema,
      handle: ({ scope, query }) => memberWeek(scope, scope.memberId, query),
    }),
    shopRoute({
      method: 'get',
      path: '/time/weeks',
      summary: "Everybody's week",
      // Who may correct everybody's time may read it; the crew reads its own by the route above.
      allow: ['correct', 'TimeEntry'],
      query: weekQuerySchema,
      answer: shopWeekSchema,
      handle: ({ scope, query }) => shopWeek(scope, query),
    }),
    shopRoute({
      method: 'get',
      path: '/time/weeks/export',
      summary: "Everybody's week as CSV",
      allow: ['export', 'TimeEntry'],
      query: weekQuerySchema,
      handle: ({ scope, query }) => exportWeek(scope, query),
    }),
    shopRoute({
      method: 'get',
      path: '/time/weeks/:memberId',
      summary: "A member's week with its entries",
      allow: ['read', 'TimeEntry'],
      query: weekQuerySchema,
      answer: memberWeekSchema,
      handle: ({ scope, params, query }) => memberWeek(scope, params.memberId, query),
    }),
  ];
}
