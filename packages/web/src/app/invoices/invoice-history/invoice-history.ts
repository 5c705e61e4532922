import { ChangeDetectionStrategy, Component, inject, input } from '@angular/core';
import { MatIconButton } from '@angular/material/button';
import { MatDialog } from '@angular/material/dialog';
import { MatIcon } from '@angular/material/icon';
import { MatMenu, MatMenuItem, MatMenuTrigger } from '@angular/material/menu';
import {
  INVOICE_DOCUMENT_NAMES,
  PAYMENT_KIND_NAMES,
  PAYMENT_METHOD_NAMES,
} from '@bookmatch/common/invoices/invoice-words';
import type { CreditNote, Invoice, Payment } from '@bookmatch/common/invoices/invoices-contract';
import { Store } from '@ngrx/store';
import { injectCan } from '../../platform/session/ability';
import { Confirm } from '../../ui/confirm/confirm';
import { DateTextPipe } from '../../ui/formats/date-text.pipe';
import { MoneyPipe } from '../../ui/formats/money.pipe';
import { Panel } from '../../ui/panel/panel';
import { StatusChip } from '../../ui/status-chip/status-chip';
import { InvoicesApiClient, type LetterSubject } from '../invoices-api';
import { LetterDialog, type LetterQuestion } from '../letter-dialog/letter-dialog';
import { InvoicesPage } from '../state/invoices.actions';

/** What became of an issued invoice: payments, credits and letters. */
@Component({
  selector: 'bm-invoice-history',
  imports: [
    DateTextPipe,
    MatIcon,
    MatIconButton,
    MatMenu,
    MatMenuItem,
    MatMenuTrigger,
    MoneyPipe,
    Panel,
    StatusChip,
  ],
  templateUrl: './invoice-history.html',
  styleUrl: './invoice-history.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class InvoiceHistory {
  readonly invoice = input.required<Invoice>();

  private readonly store = inject(Store);
  private readonly api = inject(InvoicesApiClient);
  private readonly confirm = inject(Confirm);
  private readonly dialog = inject(MatDialog);
  protected readonly can = injectCan();
  protected readonly kinds = PAYMENT_KIND_NAMES;
  protected readonly methods = PAYMENT_METHOD_NAMES;
  protected readonly documents = INVOICE_DOCUMENT_NAMES;

  protected pdfUrl(document: LetterSubject['document'], id: string): string {
    return this.api.pdfUrl(document, id);
  }

  /** Only what was recorded by hand can be taken back, and once. */
  protected isReversible({ kind, method, reversedById }: Payment): boolean {
    return kind === 'payment' && method !== 'card' && reversedById === null && this.can('correct', 'Payment');
  }

  protected reverse({ id }: Payment): void {
    const question = {
      title: 'Take this payment back?',
      text: 'For a payment that was recorded wrongly. Both records stay, and the amount is owed again.',
      action: 'Take back',
      tone: 'harm',
      reason: { label: 'What was wrong', required: true },
    } as const;
    this.confirm.ask(question).subscribe((answer) => {
      if (answer)
        this.store.dispatch(InvoicesPage.reversalConfirmed({ paymentId: id, reason: answer.reason }));
    });
  }

  protected sendReceipt({ id }: Payment): void {
    this.sendLetter({ document: 'payment-receipt', id });
  }

  protected sendCreditNote({ id }: CreditNote): void {
    this.sendLetter({ document: 'credit-note', id });
  }

  private sendLetter(subject: LetterSubject): void {
    const { id: invoiceId, customer } = this.invoice();
    const data: LetterQuestion = { invoiceId, subject, to: customer.email };
    this.dialog.open(LetterDialog, { data, width: '460px' });
  }
}
