import type { Problem } from '@bookmatch/common/problems/problem';
import type { Today } from '@bookmatch/common/today/today-contract';
import { createActionGroup, emptyProps, props } from '@ngrx/store';

/** What happened on the screen. */
export const TodayPage = createActionGroup({ source: 'Today Page', events: { opened: emptyProps() } });

/** What the server said. */
export const TodayApi = createActionGroup({
  source: 'Today API',
  events: { loaded: props<{ page: Today }>(), failed: props<{ problem: Problem }>() },
});
