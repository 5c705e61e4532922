import { dateIn } from '@bookmatch/common/calendar/shop-dates';
import type { ShopScope } from '../../platform/database/scope.js';
import { Shop } from './shop.entity.js';

/** The shop that the request is about. */
export const shopOf = (scope: ShopScope): Promise<Shop> => scope.global(Shop).get(scope.shopId);

/** The date on the wall of the shop. */
export const todayAt = (shop: Shop, now: Date): string => dateIn(shop.timeZone, now.toISOString());

/** The shop's date now, without reading the shop where its zone came with the membership. */
export async function todayOf(scope: ShopScope): Promise<string> {
  return dateIn(scope.timeZone ?? (await shopOf(scope)).timeZone, scope.now.toISOString());
}
