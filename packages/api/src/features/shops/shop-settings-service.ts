import { refuseDefaultSchedule } from '@bookmatch/common/shops/default-schedule';
import type { Shop as ShopView, UpdateShop } from '@bookmatch/common/shops/shops-contract';
import type { ShopScope } from '../../platform/database/scope.js';
import { staleVersion } from '../../platform/database/shop-repository.js';
import { refuse } from '../../platform/http/problem-error.js';
import { Shop } from './shop.entity.js';

/** What the shop says about itself, and what new estimates and invoices start from. */
export class ShopSettingsService {
  async get(scope: ShopScope): Promise<ShopView> {
    return viewShop(await scope.global(Shop).get(scope.shopId));
  }

  /** Changes what is given and leaves the rest. The slug stays: it stands in addresses that people kept. */
  async update(scope: ShopScope, input: UpdateShop, version: number): Promise<ShopView> {
    if (input.defaultBillingSchedule) refuse(refuseDefaultSchedule(input.defaultBillingSchedule));
    const shops = scope.global(Shop);
    const shop = await shops.get(scope.shopId, true);
    if (shop.version !== version) throw staleVersion(shop);
    const bookkeeping = { version: version + 1, updatedAt: scope.now };
    return viewShop(await shops.update(shop, { ...input, ...bookkeeping }));
  }
}

export function viewShop({ paymentAccountId: _ours, ...shop }: Shop): ShopView {
  return shop;
}
