import { ChangeDetectionStrategy, Component, computed, effect, inject } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatIcon } from '@angular/material/icon';
import { RouterLink } from '@angular/router';
import { Store } from '@ngrx/store';
import { injectListAddress } from '../../platform/lists/list-address';
import { injectCan } from '../../platform/session/ability';
import { DateTextPipe } from '../../ui/formats/date-text.pipe';
import { MoneyPipe } from '../../ui/formats/money.pipe';
import { SHOP_CURRENCY } from '../../ui/formats/shop-settings';
import { PageHead } from '../../ui/page-head/page-head';
import { Panel } from '../../ui/panel/panel';
import { ProblemNote } from '../../ui/problem-note/problem-note';
import { Skeleton } from '../../ui/skeleton/skeleton';
import { LedgerApiClient } from '../ledger-api';
import { LedgerViews } from '../ledger-views/ledger-views';
import { ACCOUNT_TYPE_NAMES } from '../ledger-words';
import { LedgerPage } from '../state/ledger.actions';
import { selectBalance, selectBalanceProblem } from '../state/ledger.selectors';

/** Every account with its balance at the end of a day; each opens what it is made of. */
@Component({
  selector: 'bm-trial-balance',
  imports: [
    DateTextPipe,
    LedgerViews,
    MatButton,
    MatIcon,
    MoneyPipe,
    PageHead,
    Panel,
    ProblemNote,
    RouterLink,
    Skeleton,
  ],
  templateUrl: './trial-balance.html',
  styleUrl: './trial-balance.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class TrialBalance {
  private readonly store = inject(Store);
  private readonly api = inject(LedgerApiClient);
  protected readonly can = injectCan();
  protected readonly currency = inject(SHOP_CURRENCY);
  protected readonly types = ACCOUNT_TYPE_NAMES;
  protected readonly address = injectListAddress('on');
  protected readonly balance = this.store.selectSignal(selectBalance);
  protected readonly problem = this.store.selectSignal(selectBalanceProblem);
  protected readonly csvUrl = computed(() => this.api.csvUrl({ to: this.address.query()['on'] }));

  constructor() {
    effect(() => this.load());
  }

  protected load(): void {
    const { on } = this.address.query();
    this.store.dispatch(LedgerPage.balanceOpened({ query: on ? { on } : {} }));
  }
}
