import { ChangeDetectionStrategy, Component, computed, effect, inject, input } from '@angular/core';
import type { AccountCode, LedgerSide } from '@bookmatch/common/ledger/chart-of-accounts';
import { formatAmount } from '@bookmatch/common/money/format';
import { Store } from '@ngrx/store';
import { injectListAddress } from '../../platform/lists/list-address';
import { Cell } from '../../ui/data-table/cell';
import type { Column } from '../../ui/data-table/column';
import { DataTable } from '../../ui/data-table/data-table';
import { EmptyState } from '../../ui/empty-state/empty-state';
import { DateTextPipe } from '../../ui/formats/date-text.pipe';
import { MoneyPipe } from '../../ui/formats/money.pipe';
import { SHOP_CURRENCY } from '../../ui/formats/shop-settings';
import { PageHead } from '../../ui/page-head/page-head';
import { Panel } from '../../ui/panel/panel';
import { accountName } from '../ledger-words';
import { LedgerPage } from '../state/ledger.actions';
import { selectActivityHead, selectActivityList } from '../state/ledger.selectors';
import type { ActivityRow } from '../state/ledger.state';

/** What happened on one account, with the balance after each line. */
@Component({
  selector: 'bm-account-activity',
  imports: [Cell, DataTable, DateTextPipe, EmptyState, MoneyPipe, PageHead, Panel],
  templateUrl: './account-activity.html',
  styleUrl: './account-activity.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class AccountActivity {
  /** From the address. */
  readonly code = input.required<AccountCode>();

  private readonly store = inject(Store);
  private readonly currency = inject(SHOP_CURRENCY);
  protected readonly accountName = accountName;
  protected readonly address = injectListAddress('from', 'to', 'customerId');
  protected readonly list = this.store.selectSignal(selectActivityList);
  protected readonly head = this.store.selectSignal(selectActivityHead);
  protected readonly columns = computed<readonly Column<ActivityRow>[]>(() => [
    { key: 'memo', header: 'What', text: ({ memo }) => memo, phone: 'title' },
    { key: 'number', header: 'Entry', sort: 'number', text: ({ entryNumber }) => String(entryNumber) },
    { key: 'on', header: 'Counts on' },
    { key: 'debit', header: 'Debit', align: 'end', text: (row) => onSide(row, 'debit') },
    { key: 'credit', header: 'Credit', align: 'end', text: (row) => onSide(row, 'credit') },
    { key: 'balance', header: `Balance, ${this.currency()}`, align: 'end', phone: 'side' },
  ]);
  protected readonly linkOf = ({ entryId }: ActivityRow): string => `/ledger/entries/${entryId}`;

  constructor() {
    effect(() => this.load());
  }

  protected load(): void {
    this.store.dispatch(LedgerPage.activityOpened({ code: this.code(), query: this.address.query() }));
  }
}

function onSide({ side, amountCents }: ActivityRow, wanted: LedgerSide): string {
  return side === wanted ? formatAmount(amountCents) : '';
}
