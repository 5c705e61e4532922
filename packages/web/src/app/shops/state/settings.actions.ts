import type { Problem } from '@bookmatch/common/problems/problem';
import type { Shop, UpdateShop } from '@bookmatch/common/shops/shops-contract';
import { createActionGroup, emptyProps, props } from '@ngrx/store';

/** What happened on the screens of the shop's settings and of its card payments. */
export const SettingsPage = createActionGroup({
  source: 'Settings Page',
  events: {
    opened: emptyProps(),
    formOpened: emptyProps(),
    saveSubmitted: props<{ version: number; fields: UpdateShop }>(),
    /** The browser came back from the page of the payment provider. */
    returnedFromProvider: emptyProps(),
    cardPaymentsPressed: emptyProps(),
  },
});

/** What the server said. */
export const SettingsApi = createActionGroup({
  source: 'Settings API',
  events: {
    loaded: props<{ shop: Shop }>(),
    loadFailed: props<{ problem: Problem }>(),
    saved: props<{ shop: Shop }>(),
    saveFailed: props<{ problem: Problem }>(),
    providerPageReady: props<{ url: string }>(),
    cardPaymentsFailed: props<{ problem: Problem }>(),
  },
});
