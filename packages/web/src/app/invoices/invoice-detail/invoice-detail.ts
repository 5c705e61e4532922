import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  untracked,
} from '@angular/core';
import { MatButton, MatIconButton } from '@angular/material/button';
import { MatDialog } from '@angular/material/dialog';
import { MatIcon } from '@angular/material/icon';
import { MatMenu, MatMenuItem, MatMenuTrigger } from '@angular/material/menu';
import { RouterLink } from '@angular/router';
import { INVOICE_KIND_NAMES } from '@bookmatch/common/invoices/invoice-words';
import type { Invoice } from '@bookmatch/common/invoices/invoices-contract';
import { Store } from '@ngrx/store';
import { injectCan } from '../../platform/session/ability';
import { Confirm } from '../../ui/confirm/confirm';
import { DateTextPipe } from '../../ui/formats/date-text.pipe';
import { MoneyPipe } from '../../ui/formats/money.pipe';
import { PageHead } from '../../ui/page-head/page-head';
import { Panel } from '../../ui/panel/panel';
import { ProblemNote } from '../../ui/problem-note/problem-note';
import { Skeleton } from '../../ui/skeleton/skeleton';
import { CreditDialog } from '../credit-dialog/credit-dialog';
import { InvoiceHistory } from '../invoice-history/invoice-history';
import { InvoiceLines } from '../invoice-lines/invoice-lines';
import { InvoicesApiClient } from '../invoices-api';
import { PaymentDialog } from '../payment-dialog/payment-dialog';
import { RefundDialog } from '../refund-dialog/refund-dialog';
import { SendDialog } from '../send-dialog/send-dialog';
import { StandingChip } from '../standing-chip/standing-chip';
import { InvoicesPage } from '../state/invoices.actions';
import { selectInvoice, selectOpenProblem } from '../state/invoices.selectors';
import { nextStep } from './next-step';

@Component({
  selector: 'bm-invoice-detail',
  imports: [
    DateTextPipe,
    InvoiceHistory,
    InvoiceLines,
    MatButton,
    MatIcon,
    MatIconButton,
    MatMenu,
    MatMenuItem,
    MatMenuTrigger,
    MoneyPipe,
    PageHead,
    Panel,
    ProblemNote,
    RouterLink,
    Skeleton,
    StandingChip,
  ],
  templateUrl: './invoice-detail.html',
  styleUrl: './invoice-detail.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class InvoiceDetail {
  /** From the address. */
  readonly id = input.required<string>();

  private readonly store = inject(Store);
  private readonly api = inject(InvoicesApiClient);
  private readonly dialog = inject(MatDialog);
  private readonly confirm = inject(Confirm);
  protected readonly can = injectCan();
  protected readonly kindNames = INVOICE_KIND_NAMES;

  private readonly selected = computed(() => this.store.selectSignal(selectInvoice(this.id())));
  protected readonly invoice = computed(() => this.selected()());
  protected readonly problem = this.store.selectSignal(selectOpenProblem);
  protected readonly step = computed(() => {
    const invoice = this.invoice();
    return invoice ? nextStep(invoice) : 'none';
  });
  protected readonly pdfUrl = computed(() => this.api.pdfUrl('invoice', this.id()));

  constructor() {
    effect(() => this.load());
  }

  protected load(): void {
    const id = this.id();
    untracked(() => this.store.dispatch(InvoicesPage.invoiceOpened({ id })));
  }

  protected openSend(): void {
    this.dialog.open(SendDialog, { data: this.id(), width: '560px', disableClose: true });
  }

  protected openPayment(): void {
    this.dialog.open(PaymentDialog, { data: this.id(), width: '600px', disableClose: true });
  }

  protected openRefund(): void {
    this.dialog.open(RefundDialog, { data: this.id(), width: '600px', disableClose: true });
  }

  protected openCredit(): void {
    this.dialog.open(CreditDialog, { data: this.id(), width: '600px', disableClose: true });
  }

  protected copyLink({ id }: Invoice): void {
    this.store.dispatch(InvoicesPage.linkWanted({ invoiceId: id }));
  }

  protected remove({ id, version }: Invoice): void {
    const question = {
      title: 'Delete this draft?',
      text: 'It was never issued, so nothing is owed on it. A billing stage can be billed again.',
      action: 'Delete draft',
      tone: 'harm',
    } as const;
    this.confirm.ask(question).subscribe((answer) => {
      if (answer) this.store.dispatch(InvoicesPage.deletionConfirmed({ invoice: { id, version } }));
    });
  }
}
