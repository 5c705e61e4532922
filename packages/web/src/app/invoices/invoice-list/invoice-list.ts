import { ChangeDetectionStrategy, Component, computed, effect, inject } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatIcon } from '@angular/material/icon';
import { RouterLink } from '@angular/router';
import type { InvoiceRow } from '@bookmatch/common/invoices/invoices-contract';
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
import { Panel } from '../../ui/panel/panel';
import { SearchField } from '../../ui/search-field/search-field';
import { StatusChip } from '../../ui/status-chip/status-chip';
import { AgingStrip } from '../aging-strip/aging-strip';
import { InvoiceViews } from '../invoice-views/invoice-views';
import { InvoicesApiClient } from '../invoices-api';
import { StandingChip } from '../standing-chip/standing-chip';
import { InvoicesPage } from '../state/invoices.actions';
import { selectInvoiceList, selectTotals } from '../state/invoices.selectors';

@Component({
  selector: 'bm-invoice-list',
  imports: [
    AgingStrip,
    Cell,
    ChoiceField,
    DataTable,
    EmptyState,
    InvoiceViews,
    MatButton,
    MatIcon,
    MoneyPipe,
    PageHead,
    Panel,
    RouterLink,
    SearchField,
    StandingChip,
    StatusChip,
  ],
  // Columns write dates as text, so that an empty one leaves no gap on a phone.
  providers: [DateTextPipe],
  templateUrl: './invoice-list.html',
  styleUrl: './invoice-list.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class InvoiceList {
  private readonly store = inject(Store);
  private readonly api = inject(InvoicesApiClient);
  private readonly currency = inject(SHOP_CURRENCY);
  private readonly dateText = inject(DateTextPipe);
  protected readonly can = injectCan();
  protected readonly address = injectListAddress('standing', 'customerId', 'jobId', 'issuedFrom', 'issuedTo');
  protected readonly list = this.store.selectSignal(selectInvoiceList);
  protected readonly totals = this.store.selectSignal(selectTotals);
  protected readonly csvUrl = computed(() =>
    this.can('export', 'Invoice') ? this.api.csvUrl('/invoices', this.address.query()) : undefined,
  );

  protected readonly standings = [
    { value: '', name: 'Every standing' },
    { value: 'draft', name: 'Drafts' },
    { value: 'open', name: 'Open' },
    { value: 'overdue', name: 'Overdue' },
    { value: 'paid', name: 'Paid' },
    { value: 'credited', name: 'Credited' },
  ];
  protected readonly columns = computed<readonly Column<InvoiceRow>[]>(() => [
    { key: 'number', header: 'Invoice', sort: 'number', width: '92px' },
    { key: 'customer', header: 'Customer', text: ({ customerName }) => customerName, width: '24%' },
    { key: 'what', header: 'For', text: whatFor, phone: 'hidden' },
    {
      key: 'issuedOn',
      header: 'Issued',
      sort: 'issuedOn',
      text: (row) => this.day(row.issuedOn),
      phone: 'hidden',
    },
    { key: 'dueOn', header: 'Due', sort: 'dueOn', text: (row) => this.day(row.dueOn) },
    { key: 'total', header: `Total, ${this.currency()}`, align: 'end', phone: 'side' },
    { key: 'balance', header: `Balance, ${this.currency()}`, align: 'end', phone: 'hidden' },
    { key: 'standing', header: 'Standing', width: '150px' },
  ]);
  protected readonly linkOf = ({ id }: InvoiceRow): string => `/invoices/${id}`;

  constructor() {
    effect(() => this.load());
    this.store.dispatch(InvoicesPage.totalsWanted());
  }

  private day(date: string | null): string {
    return this.dateText.transform(date);
  }

  protected load(): void {
    this.store.dispatch(InvoicesPage.listOpened({ query: this.address.query() }));
  }
}

/** The stage of a job, or the job, or nothing for work without one. */
function whatFor({ jobNumber, stageName }: InvoiceRow): string {
  if (jobNumber === null) return '';
  return stageName === null ? `Job ${jobNumber}` : `Job ${jobNumber}, ${stageName}`;
}
