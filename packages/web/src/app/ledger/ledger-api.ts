import { inject, Injectable } from '@angular/core';
import {
  accountActivitySchema,
  ledgerEntrySchema,
  ledgerPageSchema,
  trialBalanceSchema,
  type AccountActivity,
  type LedgerEntry,
  type TrialBalance,
} from '@bookmatch/common/ledger/ledger-contract';
import type { Page } from '@bookmatch/common/wire/list';
import type { Observable } from 'rxjs';
import { ApiClient } from '../platform/api/api-client';
import { withQuery } from '../platform/api/query-params';
import type { ListQuery } from '../platform/lists/list-address';
import { injectShopUrl } from '../platform/session/current-shop';

/** The routes of the ledger; it is only read. */
@Injectable({ providedIn: 'root' })
export class LedgerApiClient {
  private readonly api = inject(ApiClient);
  private readonly shopUrl = injectShopUrl();

  trialBalance(query: ListQuery): Observable<TrialBalance> {
    return this.api.get(this.shopUrl('/ledger/trial-balance'), { answer: trialBalanceSchema, query });
  }

  entries(query: ListQuery): Observable<Page<LedgerEntry>> {
    return this.api.get(this.shopUrl('/ledger/entries'), { answer: ledgerPageSchema, query });
  }

  entry(id: string): Observable<LedgerEntry> {
    return this.api.get(this.shopUrl(`/ledger/entries/${id}`), { answer: ledgerEntrySchema });
  }

  activity(code: string, query: ListQuery): Observable<AccountActivity> {
    return this.api.get(this.shopUrl(`/ledger/accounts/${code}`), { answer: accountActivitySchema, query });
  }

  csvUrl({ from, to }: ListQuery): string {
    return withQuery(this.shopUrl('/ledger/export'), { from, to });
  }
}
