import { inject, type Provider } from '@angular/core';
import { CurrentShop } from '../../platform/session/current-shop';
import { SHOP_ZONE } from '../../ui/formats/shop-settings';

/** Times on the wall of the member's shop, as the application wires it. */
export const shopZone: Provider = { provide: SHOP_ZONE, useFactory: () => inject(CurrentShop).timeZone };
