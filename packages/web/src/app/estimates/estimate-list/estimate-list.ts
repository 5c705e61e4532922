import { ChangeDetectionStrategy, Component, computed, effect, inject } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatIcon } from '@angular/material/icon';
import { RouterLink } from '@angular/router';
import { ESTIMATE_STATUS_NAMES } from '@bookmatch/common/estimates/estimate-words';
import { ESTIMATE_STATUSES, type EstimateRow } from '@bookmatch/common/estimates/estimates-contract';
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
import { PageHead } from '../../ui/page-head/page-head';
import { SearchField } from '../../ui/search-field/search-field';
import { StatusChip } from '../../ui/status-chip/status-chip';
import { counted, ESTIMATE_STATUS_TONES } from '../estimate-names';
import { EstimatesApiClient } from '../estimates-api';
import { EstimatesPage } from '../state/estimates.actions';
import { selectEstimateList } from '../state/estimates.selectors';

@Component({
  selector: 'bm-estimate-list',
  imports: [
    Cell,
    ChoiceField,
    DataTable,
    DateTextPipe,
    EmptyState,
    MatButton,
    MatIcon,
    MoneyPipe,
    PageHead,
    RouterLink,
    SearchField,
    StatusChip,
  ],
  templateUrl: './estimate-list.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class EstimateList {
  private readonly store = inject(Store);
  private readonly api = inject(EstimatesApiClient);
  protected readonly can = injectCan();
  protected readonly address = injectListAddress('status', 'customerId', 'leadId');
  protected readonly list = this.store.selectSignal(selectEstimateList);
  protected readonly statusNames = ESTIMATE_STATUS_NAMES;
  protected readonly statusTones = ESTIMATE_STATUS_TONES;
  protected readonly counted = counted;

  protected readonly statuses = [
    { value: '', name: 'Every status' },
    ...ESTIMATE_STATUSES.map((value) => ({ value, name: ESTIMATE_STATUS_NAMES[value] })),
  ];
  protected readonly columns: readonly Column<EstimateRow>[] = [
    { key: 'title', header: 'Estimate', sort: 'title', width: '30%' },
    { key: 'number', header: 'Number', sort: 'number', phone: 'hidden' },
    { key: 'customerName', header: 'Customer', text: ({ customerName }) => customerName },
    { key: 'status', header: 'Status', phone: 'line' },
    { key: 'validUntil', header: 'Valid until', phone: 'hidden' },
    { key: 'createdAt', header: 'Started', sort: 'createdAt', phone: 'hidden' },
    { key: 'totalCents', header: 'Price with tax', align: 'end', phone: 'side' },
  ];
  protected readonly csvUrl = computed(() => this.api.csvUrl(this.address.query()));
  protected readonly linkOf = ({ id }: EstimateRow): string => `/estimates/${id}`;

  constructor() {
    effect(() => this.load());
  }

  protected load(): void {
    this.store.dispatch(EstimatesPage.listOpened({ query: this.address.query() }));
  }
}
