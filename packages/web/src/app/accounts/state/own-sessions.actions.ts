import type { OwnSession } from '@bookmatch/common/accounts/accounts-contract';
import type { Problem } from '@bookmatch/common/problems/problem';
import { createActionGroup, emptyProps, props } from '@ngrx/store';

export const OwnSessionsPage = createActionGroup({
  source: 'Own Sessions Page',
  events: {
    opened: emptyProps(),
    endPressed: props<{ id: string }>(),
  },
});

export const OwnSessionsApi = createActionGroup({
  source: 'Own Sessions API',
  events: {
    loaded: props<{ sessions: OwnSession[] }>(),
    loadFailed: props<{ problem: Problem }>(),
    ended: props<{ id: string }>(),
    endFailed: props<{ problem: Problem }>(),
  },
});
