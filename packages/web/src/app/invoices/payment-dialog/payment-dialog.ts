import { ChangeDetectionStrategy, Component, effect, inject } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import {
  MAT_DIALOG_DATA,
  MatDialogActions,
  MatDialogContent,
  MatDialogRef,
  MatDialogTitle,
} from '@angular/material/dialog';
import { MatError, MatFormField, MatLabel, MatPrefix } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { MatOption, MatSelect } from '@angular/material/select';
import { dateIn } from '@bookmatch/common/calendar/shop-dates';
import { RECORDED_METHODS, type RecordedMethod } from '@bookmatch/common/invoices/invoice-standings';
import { PAYMENT_METHOD_NAMES } from '@bookmatch/common/invoices/invoice-words';
import { recordPaymentSchema } from '@bookmatch/common/invoices/invoices-contract';
import { Store } from '@ngrx/store';
import { checkForm } from '../../ui/form-errors/check-form';
import { ErrorOf } from '../../ui/form-errors/error-of';
import { focusFirstInvalid, FormErrors } from '../../ui/form-errors/form-errors';
import { MoneyPipe } from '../../ui/formats/money.pipe';
import { SHOP_ZONE } from '../../ui/formats/shop-settings';
import { MoneyInput } from '../../ui/money-input/money-input';
import { InvoicesPage } from '../state/invoices.actions';
import { selectInvoice, selectSave } from '../state/invoices.selectors';

/** Records a check, cash or a transfer; all that is owed unless another amount is typed. */
@Component({
  selector: 'bm-payment-dialog',
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
    MatOption,
    MatPrefix,
    MatSelect,
    MoneyInput,
    MoneyPipe,
    ReactiveFormsModule,
  ],
  templateUrl: './payment-dialog.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PaymentDialog {
  private readonly store = inject(Store);
  private readonly builder = inject(NonNullableFormBuilder);
  protected readonly dialog = inject<MatDialogRef<PaymentDialog>>(MatDialogRef);
  protected readonly invoice = this.store.selectSignal(selectInvoice(inject<string>(MAT_DIALOG_DATA)));
  protected readonly save = this.store.selectSignal(selectSave);
  protected readonly methods = RECORDED_METHODS.map((value) => ({
    value,
    name: PAYMENT_METHOD_NAMES[value],
  }));
  protected readonly today = dateIn(inject(SHOP_ZONE)(), new Date().toISOString());
  protected readonly form = this.builder.group({
    method: this.builder.control<RecordedMethod>('check'),
    amountCents: this.builder.control<number | null>(this.invoice()?.balanceCents ?? null),
    receivedOn: this.today,
    reference: '',
  });

  constructor() {
    this.store.dispatch(InvoicesPage.formOpened());
    effect(() => {
      if (this.save().status === 'saved') this.dialog.close();
    });
  }

  protected submit(element: HTMLFormElement): void {
    const payment = checkForm(this.form, recordPaymentSchema);
    const invoice = this.invoice();
    if (!payment || !invoice) {
      focusFirstInvalid(element);
      return;
    }
    const { id, version } = invoice;
    this.store.dispatch(InvoicesPage.paymentSubmitted({ invoice: { id, version }, payment }));
  }
}
