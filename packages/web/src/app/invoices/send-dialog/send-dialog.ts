import { ChangeDetectionStrategy, Component, computed, effect, inject } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import {
  MAT_DIALOG_DATA,
  MatDialogActions,
  MatDialogContent,
  MatDialogRef,
  MatDialogTitle,
} from '@angular/material/dialog';
import { MatError, MatFormField, MatLabel } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { sendInvoiceSchema } from '@bookmatch/common/invoices/invoices-contract';
import { Store } from '@ngrx/store';
import { checkForm } from '../../ui/form-errors/check-form';
import { ErrorOf } from '../../ui/form-errors/error-of';
import { focusFirstInvalid, FormErrors } from '../../ui/form-errors/form-errors';
import { MoneyPipe } from '../../ui/formats/money.pipe';
import { InvoicesPage } from '../state/invoices.actions';
import { selectInvoice, selectSave } from '../state/invoices.selectors';

/**
 * Sends an invoice; a draft is issued on the way. When the letter is refused after that, the dialog goes on with the
 * letter alone, since the invoice in the store is issued by then.
 */
@Component({
  selector: 'bm-send-dialog',
  imports: [
    ErrorOf,
    FormErrors,
    MatButton,
    MatDialogActions,
    MatDialogContent,
    MatDialogTitle,
    MatError,
    MatFormField,
    MatInput,
    MatLabel,
    MoneyPipe,
    ReactiveFormsModule,
  ],
  templateUrl: './send-dialog.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SendDialog {
  private readonly store = inject(Store);
  protected readonly dialog = inject<MatDialogRef<SendDialog>>(MatDialogRef);
  protected readonly invoice = this.store.selectSignal(selectInvoice(inject<string>(MAT_DIALOG_DATA)));
  protected readonly save = this.store.selectSignal(selectSave);
  protected readonly form = inject(NonNullableFormBuilder).group({
    to: this.invoice()?.customer.email ?? '',
    message: '',
  });

  protected readonly isDraft = computed(() => this.invoice()?.status === 'draft');
  protected readonly title = computed(() => {
    if (this.isDraft()) return 'Issue and send';
    const { standing, number } = this.invoice() ?? {};
    return standing === 'overdue' ? `Remind of invoice ${number}` : `Send invoice ${number}`;
  });

  constructor() {
    this.store.dispatch(InvoicesPage.formOpened());
    effect(() => {
      if (this.save().status === 'saved') this.dialog.close();
    });
  }

  protected issueOnly(): void {
    const invoice = this.invoice();
    if (invoice) this.store.dispatch(InvoicesPage.issueSubmitted({ invoice: ref(invoice) }));
  }

  protected submit(element: HTMLFormElement): void {
    const letter = checkForm(this.form, sendInvoiceSchema);
    const invoice = this.invoice();
    if (!letter || !invoice) {
      focusFirstInvalid(element);
      return;
    }
    const send = this.isDraft() ? InvoicesPage.issueAndSendSubmitted : InvoicesPage.sendSubmitted;
    this.store.dispatch(send({ invoice: ref(invoice), letter }));
  }
}

const ref = ({ id, version }: { id: string; version: number }) => ({ id, version });
