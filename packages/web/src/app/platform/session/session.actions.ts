import type { Session } from '@bookmatch/common/accounts/accounts-contract';
import type { Problem } from '@bookmatch/common/problems/problem';
import { createActionGroup, emptyProps, props } from '@ngrx/store';

export const SessionPage = createActionGroup({
  source: 'Session Page',
  events: {
    started: props<{ slug: string | null }>(),
    signedIn: emptyProps(),
    signOutPressed: props<{ everywhere: boolean }>(),
    nameChanged: props<{ name: string }>(),
    /** What the session says of the shop (its name, its zone, how it stands) is no longer so: read it again. */
    shopChanged: emptyProps(),
  },
});

export const SessionApi = createActionGroup({
  source: 'Session API',
  events: {
    loaded: props<{ session: Session }>(),
    missing: emptyProps(),
    loadFailed: props<{ problem: Problem }>(),
    signedOut: emptyProps(),
    signOutFailed: props<{ problem: Problem }>(),
  },
});
