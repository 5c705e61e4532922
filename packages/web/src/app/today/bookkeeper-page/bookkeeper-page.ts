import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatIcon } from '@angular/material/icon';
import { RouterLink } from '@angular/router';
import { weekStart } from '@bookmatch/common/calendar/shop-dates';
import type { BookkeeperToday } from '@bookmatch/common/today/today-contract';
import { AgingStrip } from '../../invoices/invoices-public';
import { DateTextPipe } from '../../ui/formats/date-text.pipe';
import { MoneyPipe } from '../../ui/formats/money.pipe';
import { SHOP_ZONE } from '../../ui/formats/shop-settings';
import { PageHead } from '../../ui/page-head/page-head';
import { Panel } from '../../ui/panel/panel';
import { FigureTile } from '../figure-tile/figure-tile';
import { draftTask, overdueTask, paymentTask } from '../task-list/task';
import { TaskList } from '../task-list/task-list';

/** The bookkeeper's day: what is to be issued, what is late, what came in. */
@Component({
  selector: 'bm-bookkeeper-page',
  imports: [
    AgingStrip,
    DateTextPipe,
    FigureTile,
    MatButton,
    MatIcon,
    MoneyPipe,
    PageHead,
    Panel,
    RouterLink,
    TaskList,
  ],
  templateUrl: './bookkeeper-page.html',
  styleUrl: '../page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class BookkeeperPage {
  readonly page = input.required<BookkeeperToday>();
  private readonly zone = inject(SHOP_ZONE);

  protected readonly drafts = computed(() =>
    this.page().draftsToIssue.rows.map((invoice) => draftTask(invoice, this.zone(), this.page().on)),
  );
  protected readonly overdue = computed(() => this.page().overdueInvoices.rows.map(overdueTask));
  protected readonly payments = computed(() =>
    this.page().paymentsThisWeek.rows.map((payment) => paymentTask(payment, this.page().on)),
  );
  protected readonly monday = computed(() => weekStart(this.page().on));
}
