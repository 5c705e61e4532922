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
import { PAYMENT_METHODS, type PaymentMethod } from '@bookmatch/common/invoices/invoice-standings';
import { PAYMENT_METHOD_NAMES } from '@bookmatch/common/invoices/invoice-words';
import { refundOverpaymentSchema } from '@bookmatch/common/invoices/invoices-contract';
import { Store } from '@ngrx/store';
import { checkForm } from '../../ui/form-errors/check-form';
import { ErrorOf } from '../../ui/form-errors/error-of';
import { focusFirstInvalid, FormErrors } from '../../ui/form-errors/form-errors';
import { MoneyPipe } from '../../ui/formats/money.pipe';
import { SHOP_ZONE } from '../../ui/formats/shop-settings';
import { MoneyInput } from '../../ui/money-input/money-input';
import { InvoicesPage } from '../state/invoices.actions';
import { selectInvoice, selectSave } from '../state/invoices.selectors';

/** Records that money beyond the debt went back to the customer. The money itself is sent where it was charged. */
@Component({
  selector: 'bm-refund-dialog',
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
  templateUrl: './refund-dialog.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RefundDialog {
  private readonly store = inject(Store);
  private readonly builder = inject(NonNullableFormBuilder);
  protected readonly dialog = inject<MatDialogRef<RefundDialog>>(MatDialogRef);
  protected readonly invoice = this.store.selectSignal(selectInvoice(inject<string>(MAT_DIALOG_DATA)));
  protected readonly save = this.store.selectSignal(selectSave);
  protected readonly methods = PAYMENT_METHODS.map((value) => ({ value, name: PAYMENT_METHOD_NAMES[value] }));
  protected readonly today = dateIn(inject(SHOP_ZONE)(), new Date().toISOString());
  protected readonly form = this.builder.group({
    method: this.builder.control<PaymentMethod>('card'),
    amountCents: this.builder.control<number | null>(this.invoice()?.overpaidCents ?? null),
    paidOn: this.today,
    reference: '',
  });

  constructor() {
    this.store.dispatch(InvoicesPage.formOpened());
    effect(() => {
      if (this.save().status === 'saved') this.dialog.close();
    });
  }

  protected submit(element: HTMLFormElement): void {
    const refund = checkForm(this.form, refundOverpaymentSchema);
    const invoice = this.invoice();
    if (!refund || !invoice) {
      focusFirstInvalid(element);
      return;
    }
    const { id, version } = invoice;
    this.store.dispatch(InvoicesPage.refundSubmitted({ invoice: { id, version }, refund }));
  }
}
