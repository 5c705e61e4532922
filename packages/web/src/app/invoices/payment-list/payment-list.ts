import { ChangeDetectionStrategy, Component, computed, effect, inject } from '@angular/core';
import { PAYMENT_METHODS } from '@bookmatch/common/invoices/invoice-standings';
import { PAYMENT_KIND_NAMES, PAYMENT_METHOD_NAMES } from '@bookmatch/common/invoices/invoice-words';
import type { PaymentRow } from '@bookmatch/common/invoices/invoices-contract';
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
import { StatusChip } from '../../ui/status-chip/status-chip';
import { InvoiceViews } from '../invoice-views/invoice-views';
import { InvoicesApiClient } from '../invoices-api';
import { InvoicesPage } from '../state/invoices.actions';
import { selectPaymentList } from '../state/invoices.selectors';

/** Every payment, to be laid beside the bank's list. */
@Component({
  selector: 'bm-payment-list',
  imports: [
    Cell,
    ChoiceField,
    DataTable,
    DateTextPipe,
    EmptyState,
    InvoiceViews,
    MoneyPipe,
    PageHead,
    SearchField,
    StatusChip,
  ],
  templateUrl: './payment-list.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PaymentList {
  private readonly store = inject(Store);
  private readonly api = inject(InvoicesApiClient);
  private readonly can = injectCan();
  private readonly currency = inject(SHOP_CURRENCY);
  protected readonly address = injectListAddress('method', 'from', 'to');
  protected readonly list = this.store.selectSignal(selectPaymentList);
  protected readonly kinds = PAYMENT_KIND_NAMES;
  protected readonly csvUrl = computed(() =>
    this.can('export', 'Payment') ? this.api.csvUrl('/payments', this.address.query()) : undefined,
  );
  protected readonly methods = [
    { value: '', name: 'Every method' },
    ...PAYMENT_METHODS.map((value) => ({ value, name: PAYMENT_METHOD_NAMES[value] })),
  ];
  protected readonly columns = computed<readonly Column<PaymentRow>[]>(() => [
    { key: 'receivedOn', header: 'Received', sort: 'receivedOn' },
    { key: 'customer', header: 'Customer', text: ({ customerName }) => customerName, width: '26%' },
    { key: 'invoice', header: 'Invoice', text: ({ invoiceNumber }) => String(invoiceNumber) },
    { key: 'method', header: 'Method', text: ({ method }) => PAYMENT_METHOD_NAMES[method] },
    { key: 'reference', header: 'Reference', text: ({ reference }) => reference, phone: 'hidden' },
    { key: 'amount', header: `Amount, ${this.currency()}`, align: 'end', phone: 'side' },
  ]);
  protected readonly linkOf = ({ invoiceId }: PaymentRow): string => `/invoices/${invoiceId}`;

  constructor() {
    effect(() => this.load());
  }

  protected load(): void {
    this.store.dispatch(InvoicesPage.paymentsOpened({ query: this.address.query() }));
  }
}
