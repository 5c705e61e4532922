import { inject, Injectable } from '@angular/core';
import { subscriptionSchema, type Subscription } from '@bookmatch/common/subscription/subscription-contract';
import { redirectSchema, type Redirect } from '@bookmatch/common/wire/fields';
import type { Observable } from 'rxjs';
import { ApiClient } from '../platform/api/api-client';
import { injectShopUrl } from '../platform/session/current-shop';

/** The routes of the shop's own subscription, one method each. */
@Injectable({ providedIn: 'root' })
export class SubscriptionApiClient {
  private readonly api = inject(ApiClient);
  private readonly shopUrl = injectShopUrl();

  read(): Observable<Subscription> {
    return this.api.get(this.shopUrl('/subscription'), { answer: subscriptionSchema });
  }

  refresh(): Observable<Subscription> {
    return this.api.post(this.shopUrl('/subscription/refresh'), undefined, { answer: subscriptionSchema });
  }

  startCheckout(): Observable<Redirect> {
    return this.api.post(this.shopUrl('/subscription/checkout'), undefined, { answer: redirectSchema });
  }

  openPortal(): Observable<Redirect> {
    return this.api.post(this.shopUrl('/subscription/portal'), undefined, { answer: redirectSchema });
  }
}
