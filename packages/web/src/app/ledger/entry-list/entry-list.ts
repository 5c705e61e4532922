import { ChangeDetectionStrategy, Component, computed, effect, inject } from '@angular/core';
import { ENTRY_KINDS, type LedgerEntry } from '@bookmatch/common/ledger/ledger-contract';
import { MatButton } from '@angular/material/button';
import { MatIcon } from '@angular/material/icon';
import { sumCents } from '@bookmatch/common/money/cents';
import { Store } from '@ngrx/store';
import { injectListAddress } from '../../platform/lists/list-address';
import { injectCan } from '../../platform/session/ability';
import { ChoiceField } from '../../ui/choice-field/choice-field';
import { Cell } from '../../ui/data-table/cell';
import type { Column } from '../../ui/data-table/column';
import { DataTable } from '../../ui/data-table/data-table';
import { EmptyState } from '../../ui/empty-state/empty-state';
import { DateTextPipe } from '../../ui/formats/date-text.pipe';
import { MoneyPipe } from '../../ui/formats/money.pipe';
import { SHOP_CURRENCY } from '../../ui/formats/shop-settings';
import { PageHead } from '../../ui/page-head/page-head';
import { SearchField } from '../../ui/search-field/search-field';
import { LedgerApiClient } from '../ledger-api';
import { LedgerViews } from '../ledger-views/ledger-views';
import { ENTRY_KIND_NAMES } from '../ledger-words';
import { LedgerPage } from '../state/ledger.actions';
import { selectEntryList } from '../state/ledger.selectors';

/** The books entry by entry. */
@Component({
  selector: 'bm-entry-list',
  imports: [
    Cell,
    ChoiceField,
    DataTable,
    DateTextPipe,
    EmptyState,
    LedgerViews,
    MatButton,
    MatIcon,
    MoneyPipe,
    PageHead,
    SearchField,
  ],
  templateUrl: './entry-list.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class EntryList {
  private readonly store = inject(Store);
  private readonly api = inject(LedgerApiClient);
  private readonly can = injectCan();
  private readonly currency = inject(SHOP_CURRENCY);
  protected readonly address = injectListAddress('kind', 'customerId', 'jobId', 'invoiceId', 'from', 'to');
  protected readonly list = this.store.selectSignal(selectEntryList);
  protected readonly csvUrl = computed(() =>
    this.can('export', 'LedgerEntry') ? this.api.csvUrl(this.address.query()) : undefined,
  );
  /** A filter that came with the way here and has no field of its own. */
  protected readonly narrowedTo = computed(() =>
    (['invoiceId', 'jobId', 'customerId'] as const).find((name) => this.address.query()[name] !== undefined),
  );
  protected readonly only = {
    invoiceId: 'Only one invoice',
    jobId: 'Only one job',
    customerId: 'Only one customer',
  } as const;
  protected readonly kinds = [
    { value: '', name: 'Every kind' },
    ...ENTRY_KINDS.map((value) => ({ value, name: ENTRY_KIND_NAMES[value] })),
  ];
  protected readonly columns = computed<readonly Column<LedgerEntry>[]>(() => [
    { key: 'number', header: 'Entry', sort: 'number', text: ({ number }) => String(number), width: '80px' },
    { key: 'memo', header: 'What', text: ({ memo }) => memo, phone: 'title' },
    { key: 'kind', header: 'Kind', text: ({ kind }) => ENTRY_KIND_NAMES[kind], phone: 'hidden' },
    { key: 'on', header: 'Counts on' },
    { key: 'amount', header: `Amount, ${this.currency()}`, align: 'end', phone: 'side' },
  ]);
  protected readonly linkOf = ({ id }: LedgerEntry): string => `/ledger/entries/${id}`;

  constructor() {
    effect(() => this.load());
  }

  protected load(): void {
    this.store.dispatch(LedgerPage.entriesOpened({ query: this.address.query() }));
  }

  /** What an entry moves: its debits, which equal its credits. */
  protected amountOf({ lines }: LedgerEntry): number {
    return sumCents(lines.filter(({ side }) => side === 'debit').map(({ amountCents }) => amountCents));
  }
}
