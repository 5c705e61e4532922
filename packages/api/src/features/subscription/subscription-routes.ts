import { subscriptionSchema } from '@bookmatch/common/subscription/subscription-contract';
import { emptyBodySchema, redirectSchema } from '@bookmatch/common/wire/fields';
import { shopRoute, type Route } from '../../platform/http/route.js';
import type { SubscriptionService } from './subscription-service.js';

/** All of these stay open to a shop that has lapsed: they are the way back. */
export function subscriptionRoutes(service: SubscriptionService): Route[] {
  return [
    shopRoute({
      method: 'get',
      path: '/subscription',
      summary: "Read how the shop's own subscription stands",
      allow: ['read', 'Subscription'],
      answer: subscriptionSchema,
      handle: ({ scope }) => service.get(scope),
    }),
    shopRoute({
      method: 'post',
      path: '/subscription/checkout',
      summary: "Subscribe on the payment provider's page",
      allow: ['manage', 'Subscription'],
      whenLapsed: 'allowed',
      transaction: 'own',
      body: emptyBodySchema,
      answer: redirectSchema,
      handle: ({ scope, stamp, idempotencyKey }) => service.startCheckout(scope, stamp, idempotencyKey),
    }),
    shopRoute({
      method: 'post',
      path: '/subscription/portal',
      summary: "Pay, change the card or end the subscription on the payment provider's page",
      allow: ['manage', 'Subscription'],
      whenLapsed: 'allowed',
      // Each call gives a new link to the same page.
      repeat: 'natural',
      transaction: 'own',
      body: emptyBodySchema,
      answer: redirectSchema,
      handle: ({ scope }) => service.openPortal(scope),
    }),
    shopRoute({
      method: 'post',
      path: '/subscription/refresh',
      summary: 'Ask the payment provider how the subscription stands',
      allow: ['manage', 'Subscription'],
      whenLapsed: 'allowed',
      // Brings in what is so.
      repeat: 'natural',
      transaction: 'own',
      body: emptyBodySchema,
      answer: subscriptionSchema,
      handle: ({ scope, stamp }) => service.refresh(scope, stamp),
    }),
  ];
}
