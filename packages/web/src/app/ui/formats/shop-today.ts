import { inject } from '@angular/core';
import { dateIn, type DateText } from '@bookmatch/common/calendar/shop-dates';
import { SHOP_ZONE } from './shop-settings';

/** In a field of a component: `private readonly today = injectShopToday();` gives the date on the wall of the shop. */
export function injectShopToday(): () => DateText {
  const zone = inject(SHOP_ZONE);
  return () => dateIn(zone(), new Date().toISOString());
}
