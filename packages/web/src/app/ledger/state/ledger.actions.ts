import type { AccountActivity, LedgerEntry, TrialBalance } from '@bookmatch/common/ledger/ledger-contract';
import type { Problem } from '@bookmatch/common/problems/problem';
import type { Page } from '@bookmatch/common/wire/list';
import { createActionGroup, props } from '@ngrx/store';
import type { ListQuery } from '../../platform/lists/list-address';

/** What happened on the screens. */
export const LedgerPage = createActionGroup({
  source: 'Ledger Page',
  events: {
    balanceOpened: props<{ query: ListQuery }>(),
    entriesOpened: props<{ query: ListQuery }>(),
    entryOpened: props<{ id: string }>(),
    activityOpened: props<{ code: string; query: ListQuery }>(),
  },
});

/** What the server said. */
export const LedgerApi = createActionGroup({
  source: 'Ledger API',
  events: {
    balanceLoaded: props<{ balance: TrialBalance }>(),
    balanceFailed: props<{ problem: Problem }>(),
    entriesLoaded: props<{ page: Page<LedgerEntry> }>(),
    entriesFailed: props<{ problem: Problem }>(),
    entryLoaded: props<{ entry: LedgerEntry }>(),
    entryFailed: props<{ problem: Problem }>(),
    activityLoaded: props<{ activity: AccountActivity }>(),
    activityFailed: props<{ problem: Problem }>(),
  },
});
