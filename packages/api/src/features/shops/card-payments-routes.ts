import { shopSchema } from '@bookmatch/common/shops/shops-contract';
import { emptyBodySchema, redirectSchema } from '@bookmatch/common/wire/fields';
import { shopRoute, type Route } from '../../platform/http/route.js';
import type { CardPaymentsService } from './card-payments-service.js';

export function cardPaymentsRoutes(service: CardPaymentsService): Route[] {
  return [
    shopRoute({
      method: 'post',
      path: '/shop/card-payments',
      summary: "Set up card payments on the payment provider's page",
      allow: ['manage', 'PaymentAccount'],
      // One account a shop, whatever is repeated; each call gives a new link to the same page.
      repeat: 'natural',
      transaction: 'own',
      body: emptyBodySchema,
      answer: redirectSchema,
      handle: ({ scope, stamp }) => service.setUp(scope, stamp),
    }),
    shopRoute({
      method: 'post',
      path: '/shop/card-payments/refresh',
      summary: 'Ask the payment provider how the account stands',
      allow: ['manage', 'PaymentAccount'],
      // Brings in what is so.
      repeat: 'natural',
      transaction: 'own',
      body: emptyBodySchema,
      answer: shopSchema,
      handle: ({ scope, stamp }) => service.refresh(scope, stamp),
    }),
  ];
}
