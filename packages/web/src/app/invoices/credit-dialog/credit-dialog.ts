import { ChangeDetectionStrategy, Component, computed, effect, inject } from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import {
  MAT_DIALOG_DATA,
  MatDialogActions,
  MatDialogContent,
  MatDialogRef,
  MatDialogTitle,
} from '@angular/material/dialog';
import { MatError, MatFormField, MatHint, MatLabel, MatPrefix } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { creditShare } from '@bookmatch/common/invoices/payment-rules';
import { creditInvoiceSchema } from '@bookmatch/common/invoices/invoices-contract';
import { Store } from '@ngrx/store';
import { checkForm } from '../../ui/form-errors/check-form';
import { ErrorOf } from '../../ui/form-errors/error-of';
import { focusFirstInvalid, FormErrors } from '../../ui/form-errors/form-errors';
import { MoneyPipe } from '../../ui/formats/money.pipe';
import { MoneyInput } from '../../ui/money-input/money-input';
import { InvoicesPage } from '../state/invoices.actions';
import { selectInvoice, selectSave } from '../state/invoices.selectors';

/** Takes something off an issued invoice; the working of the amount is shown while it is typed. */
@Component({
  selector: 'bm-credit-dialog',
  imports: [
    ErrorOf,
    FormErrors,
    MatButton,
    MatDialogActions,
    MatDialogContent,
    MatDialogTitle,
    MatError,
    MatFormField,
    MatHint,
    MatInput,
    MatLabel,
    MatPrefix,
    MoneyInput,
    MoneyPipe,
    ReactiveFormsModule,
  ],
  templateUrl: './credit-dialog.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CreditDialog {
  private readonly store = inject(Store);
  private readonly builder = inject(NonNullableFormBuilder);
  protected readonly dialog = inject<MatDialogRef<CreditDialog>>(MatDialogRef);
  protected readonly invoice = this.store.selectSignal(selectInvoice(inject<string>(MAT_DIALOG_DATA)));
  protected readonly save = this.store.selectSignal(selectSave);
  protected readonly form = this.builder.group({
    amountCents: this.builder.control<number | null>(this.invoice()?.balanceCents ?? null),
    reason: '',
  });
  private readonly amount = toSignal(this.form.controls.amountCents.valueChanges, {
    initialValue: this.form.controls.amountCents.value,
  });
  /** Net and tax of what is typed, as the credit note will say it; nothing while it could not be given. */
  protected readonly share = computed(() => {
    const invoice = this.invoice();
    const amountCents = this.amount();
    if (!invoice || !amountCents || amountCents < 0 || amountCents > invoice.balanceCents) return null;
    return creditShare(invoice, invoice.creditedCents, amountCents);
  });

  constructor() {
    this.store.dispatch(InvoicesPage.formOpened());
    effect(() => {
      if (this.save().status === 'saved') this.dialog.close();
    });
  }

  protected submit(element: HTMLFormElement): void {
    if (this.form.controls.amountCents.value === null && this.form.controls.amountCents.valid)
      this.form.controls.amountCents.setErrors({ problem: 'Give an amount.' });
    const credit = this.form.valid ? checkForm(this.form, creditInvoiceSchema) : null;
    const invoice = this.invoice();
    if (!credit || !invoice) {
      this.form.markAllAsTouched();
      focusFirstInvalid(element);
      return;
    }
    const { id, version } = invoice;
    this.store.dispatch(InvoicesPage.creditSubmitted({ invoice: { id, version }, credit }));
  }
}
