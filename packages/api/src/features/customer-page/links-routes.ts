import {
  createdLinkSchema,
  createLinkSchema,
  linkQuerySchema,
  linkSchema,
  linksSchema,
} from '@bookmatch/common/customer-page/links-contract';
import { shopRoute, type Route } from '../../platform/http/route.js';
import type { CustomerLinks } from './customer-links.js';

/** The permissions named here let in all who may on either kind; the service asks for the kind itself. */
export function linksRoutes(links: CustomerLinks): Route[] {
  return [
    shopRoute({
      method: 'get',
      path: '/links',
      summary: 'List the links to an estimate or an invoice',
      allow: ['read', 'Invoice'],
      query: linkQuerySchema,
      answer: linksSchema,
      handle: ({ scope, query }) => links.list(scope, query),
    }),
    shopRoute({
      method: 'post',
      path: '/links',
      summary: 'Make a link to hand out',
      allow: ['send', 'Invoice'],
      // A kept answer would keep the link's secret, which stands nowhere. A repeat makes one more link; one that nobody
      // saw opens nothing for anybody.
      repeat: 'natural',
      body: createLinkSchema,
      answer: createdLinkSchema,
      status: 201,
      handle: ({ scope, body }) => links.create(scope, body),
    }),
    shopRoute({
      method: 'post',
      path: '/links/:id/revoke',
      summary: 'End a link',
      allow: ['send', 'Invoice'],
      // The second time finds it revoked already and changes nothing.
      repeat: 'natural',
      answer: linkSchema,
      handle: ({ scope, params }) => links.revoke(scope, params.id),
    }),
  ];
}
