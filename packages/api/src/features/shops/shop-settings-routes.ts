import { shopSchema, updateShopSchema } from '@bookmatch/common/shops/shops-contract';
import { shopRoute, type Route } from '../../platform/http/route.js';
import type { ShopSettingsService } from './shop-settings-service.js';

export function shopSettingsRoutes(service: ShopSettingsService): Route[] {
  return [
    shopRoute({
      method: 'get',
      path: '/shop',
      summary: "Read the shop's settings",
      allow: ['read', 'Shop'],
      answer: shopSchema,
      handle: ({ scope }) => service.get(scope),
    }),
    shopRoute({
      method: 'patch',
      path: '/shop',
      summary: "Change the shop's settings",
      allow: ['update', 'Shop'],
      versioned: true,
      body: updateShopSchema,
      answer: shopSchema,
      handle: ({ scope, body, version }) => service.update(scope, body, version),
    }),
  ];
}
