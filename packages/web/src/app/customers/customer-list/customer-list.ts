import { ChangeDetectionStrategy, Component, effect, inject } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatIcon } from '@angular/material/icon';
import { RouterLink } from '@angular/router';
import { CUSTOMER_KINDS, type CustomerRow } from '@bookmatch/common/customers/customers-contract';
import { Store } from '@ngrx/store';
import { injectListAddress } from '../../platform/lists/list-address';
import { injectCan } from '../../platform/session/ability';
import { ChoiceField } from '../../ui/choice-field/choice-field';
import { Cell } from '../../ui/data-table/cell';
import type { Column } from '../../ui/data-table/column';
import { DataTable } from '../../ui/data-table/data-table';
import { EmptyState } from '../../ui/empty-state/empty-state';
import { DateTextPipe } from '../../ui/formats/date-text.pipe';
import { PageHead } from '../../ui/page-head/page-head';
import { SearchField } from '../../ui/search-field/search-field';
import { StatusChip } from '../../ui/status-chip/status-chip';
import { CUSTOMER_KIND_NAMES } from '../customer-names';
import { CustomersPage } from '../state/customers.actions';
import { selectCustomerList } from '../state/customers.selectors';

@Component({
  selector: 'bm-customer-list',
  imports: [
    Cell,
    ChoiceField,
    DataTable,
    DateTextPipe,
    EmptyState,
    MatButton,
    MatIcon,
    PageHead,
    RouterLink,
    SearchField,
    StatusChip,
  ],
  templateUrl: './customer-list.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CustomerList {
  private readonly store = inject(Store);
  protected readonly can = injectCan();
  protected readonly address = injectListAddress('kind', 'archived');
  protected readonly list = this.store.selectSignal(selectCustomerList);

  protected readonly kinds = [
    { value: '', name: 'Every kind' },
    ...CUSTOMER_KINDS.map((value) => ({ value, name: CUSTOMER_KIND_NAMES[value] })),
  ];
  protected readonly archivedChoices = [
    { value: '', name: 'Not archived' },
    { value: 'only', name: 'Archived only' },
    { value: 'all', name: 'With archived' },
  ];
  protected readonly columns: readonly Column<CustomerRow>[] = [
    { key: 'name', header: 'Name', sort: 'name', width: '28%' },
    { key: 'kind', header: 'Kind', text: ({ kind }) => CUSTOMER_KIND_NAMES[kind], phone: 'side' },
    { key: 'city', header: 'City', text: ({ city }) => city },
    { key: 'phone', header: 'Phone', text: ({ phone }) => phone, whole: true },
    { key: 'email', header: 'E-mail', text: ({ email }) => email, phone: 'hidden' },
    { key: 'createdAt', header: 'Added', sort: 'createdAt', align: 'end', phone: 'hidden' },
  ];
  protected readonly linkOf = ({ id }: CustomerRow): string => `/customers/${id}`;

  constructor() {
    effect(() => this.load());
  }

  protected load(): void {
    this.store.dispatch(CustomersPage.listOpened({ query: this.address.query() }));
  }
}
