import type { Problem } from '@bookmatch/common/problems/problem';
import type { Subscription } from '@bookmatch/common/subscription/subscription-contract';
import { createActionGroup, emptyProps, props } from '@ngrx/store';

export const SubscriptionPage = createActionGroup({
  source: 'Subscription Page',
  events: {
    opened: emptyProps(),
    /** The browser came back from a page of the payment provider. */
    returnedFromProvider: emptyProps(),
    subscribePressed: emptyProps(),
    managePressed: emptyProps(),
  },
});

export const SubscriptionApi = createActionGroup({
  source: 'Subscription API',
  events: {
    loaded: props<{ subscription: Subscription }>(),
    refreshed: props<{ subscription: Subscription }>(),
    loadFailed: props<{ problem: Problem }>(),
    providerPageReady: props<{ url: string }>(),
    providerPageFailed: props<{ problem: Problem }>(),
  },
});
