import { computed, inject, Injectable } from '@angular/core';
import { Store } from '@ngrx/store';
import { sessionFeature } from './session.state';

/** The shop of the address, for those who are not in a store's pipe. */
@Injectable({ providedIn: 'root' })
export class CurrentShop {
  /** The member's place in it, or null outside of any shop of theirs. */
  readonly membership = inject(Store).selectSignal(sessionFeature.selectMembership);
  readonly name = computed(() => this.membership()?.shopName ?? null);
  readonly timeZone = computed(() => this.membership()?.timeZone ?? 'UTC');
  readonly unitSystem = computed(() => this.membership()?.unitSystem ?? 'inch');
  readonly currency = computed(() => this.membership()?.currency ?? 'USD');
  /** A lapsed subscription leaves everything readable and nothing changeable. */
  readonly readOnly = computed(() => this.membership()?.subscription.access === 'read-only');

  /** `/customers` becomes `/api/shops/<id>/customers`. */
  url(path: string): string {
    const membership = this.membership();
    if (!membership) throw new Error(`there is no shop in this address to ask for ${path}`);
    return `/api/shops/${membership.shopId}${path}`;
  }
}

/** For a slice's API client: `private readonly shopUrl = injectShopUrl();` */
export function injectShopUrl(): (path: string) => string {
  const shop = inject(CurrentShop);
  return (path) => shop.url(path);
}
