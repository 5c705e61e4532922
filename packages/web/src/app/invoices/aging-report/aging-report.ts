import { ChangeDetectionStrategy, Component, computed, effect, inject } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatIcon } from '@angular/material/icon';
import { RouterLink } from '@angular/router';
import { AGING_BUCKETS } from '@bookmatch/common/invoices/aging';
import { Store } from '@ngrx/store';
import { injectListAddress } from '../../platform/lists/list-address';
import { injectCan } from '../../platform/session/ability';
import { EmptyState } from '../../ui/empty-state/empty-state';
import { DateTextPipe } from '../../ui/formats/date-text.pipe';
import { MoneyPipe } from '../../ui/formats/money.pipe';
import { SHOP_CURRENCY } from '../../ui/formats/shop-settings';
import { PageHead } from '../../ui/page-head/page-head';
import { Panel } from '../../ui/panel/panel';
import { ProblemNote } from '../../ui/problem-note/problem-note';
import { Skeleton } from '../../ui/skeleton/skeleton';
import { AgingStrip } from '../aging-strip/aging-strip';
import { InvoiceViews } from '../invoice-views/invoice-views';
import { InvoicesApiClient } from '../invoices-api';
import { InvoicesPage } from '../state/invoices.actions';
import { selectAging } from '../state/invoices.selectors';

/** Who owes what, by how late it is. Every row opens the invoices behind it. */
@Component({
  selector: 'bm-aging-report',
  imports: [
    AgingStrip,
    DateTextPipe,
    EmptyState,
    InvoiceViews,
    MatButton,
    MatIcon,
    MoneyPipe,
    PageHead,
    Panel,
    ProblemNote,
    RouterLink,
    Skeleton,
  ],
  templateUrl: './aging-report.html',
  styleUrl: './aging-report.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class AgingReport {
  private readonly store = inject(Store);
  private readonly api = inject(InvoicesApiClient);
  protected readonly can = injectCan();
  protected readonly currency = inject(SHOP_CURRENCY);
  protected readonly address = injectListAddress('on');
  protected readonly aging = this.store.selectSignal(selectAging);
  protected readonly buckets = AGING_BUCKETS;
  protected readonly csvUrl = computed(() => this.api.csvUrl('/invoices/aging', this.address.query()));

  constructor() {
    effect(() => this.load());
  }

  protected load(): void {
    this.store.dispatch(InvoicesPage.agingOpened({ query: this.address.query() }));
  }
}
