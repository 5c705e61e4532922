import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  untracked,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatIcon } from '@angular/material/icon';
import { ActivatedRoute } from '@angular/router';
import type { CustomerInvoice as InvoiceView } from '@bookmatch/common/customer-page/customer-page-contract';
import { standingWords, PAYMENT_METHOD_NAMES } from '@bookmatch/common/invoices/invoice-words';
import { formatAmount, formatMoney } from '@bookmatch/common/money/format';
import { Store } from '@ngrx/store';
import { DateTextPipe } from '../../ui/formats/date-text.pipe';
import { Panel } from '../../ui/panel/panel';
import { ProblemNote } from '../../ui/problem-note/problem-note';
import { StatusChip } from '../../ui/status-chip/status-chip';
import { InvoicePageApi } from '../invoice-page-api';
import { InvoicePage, type Arrival } from '../invoice-state/invoice-page.actions';
import { invoicePageFeature } from '../invoice-state/invoice-page.state';

/** The invoice as its customer reads and pays it. */
@Component({
  selector: 'bm-customer-invoice',
  imports: [DateTextPipe, MatButton, MatIcon, Panel, ProblemNote, StatusChip],
  templateUrl: './customer-invoice.html',
  styleUrl: './customer-invoice.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CustomerInvoice {
  readonly token = input.required<string>();
  /** As the page was loaded; what a payment changes comes through the store. */
  readonly loaded = input.required<InvoiceView>();
  readonly shopName = input.required<string>();

  private readonly store = inject(Store);
  private readonly api = inject(InvoicePageApi);
  private readonly route = inject(ActivatedRoute);
  private readonly known = this.store.selectSignal(invoicePageFeature.selectInvoice);
  protected readonly invoice = computed(() => this.known() ?? this.loaded());
  protected readonly news = this.store.selectSignal(invoicePageFeature.selectNews);
  protected readonly payment = this.store.selectSignal(invoicePageFeature.selectPayment);
  protected readonly problem = this.store.selectSignal(invoicePageFeature.selectProblem);
  protected readonly pdfUrl = computed(() => this.api.pdfUrl(this.token()));
  protected readonly methods = PAYMENT_METHOD_NAMES;
  protected readonly standing = computed(() => {
    const { standing, daysOverdue } = this.invoice();
    return standingWords(standing, daysOverdue);
  });
  protected readonly tone = computed(() => {
    const { standing } = this.invoice();
    if (standing === 'overdue') return 'over';
    return standing === 'paid' ? 'good' : 'planned';
  });

  constructor() {
    effect(() => {
      const [token, invoice] = [this.token(), this.loaded()];
      untracked(() => this.store.dispatch(InvoicePage.opened({ token, invoice, arrival: this.arrival() })));
    });
  }

  protected readonly amount = formatAmount;

  protected money(cents: number): string {
    return formatMoney(cents, this.invoice().currency);
  }

  protected pay(): void {
    this.store.dispatch(InvoicePage.payPressed({ token: this.token() }));
  }

  protected check(): void {
    this.store.dispatch(InvoicePage.checkPressed({ token: this.token() }));
  }

  /** The provider's page sends back with one of two words. */
  private arrival(): Arrival {
    const word = this.route.snapshot.queryParamMap.get('payment');
    if (word === 'made') return 'paid';
    return word === 'canceled' ? 'canceled' : 'by-link';
  }
}
