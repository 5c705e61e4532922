import { ChangeDetectionStrategy, Component, inject, input, output } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatCheckbox } from '@angular/material/checkbox';
import { MatError, MatFormField, MatHint, MatLabel } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import {
  acceptEstimateSchema,
  type CustomerEstimate,
} from '@bookmatch/common/customer-page/customer-page-contract';
import { Store } from '@ngrx/store';
import { checkForm } from '../../ui/form-errors/check-form';
import { ErrorOf } from '../../ui/form-errors/error-of';
import { focusFirstInvalid, FormErrors } from '../../ui/form-errors/form-errors';
import { MoneyPipe } from '../../ui/formats/money.pipe';
import { CustomerScreen } from '../state/customer-page.actions';
import { customerPageFeature } from '../state/customer-page.state';

/** The customer's yes: a name typed and a box ticked, for exactly the document on the screen. */
@Component({
  selector: 'bm-accept-form',
  imports: [
    ErrorOf,
    FormErrors,
    MatButton,
    MatCheckbox,
    MatError,
    MatFormField,
    MatHint,
    MatInput,
    MatLabel,
    MoneyPipe,
    ReactiveFormsModule,
  ],
  templateUrl: './accept-form.html',
  styleUrl: './accept-form.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class AcceptForm {
  readonly estimate = input.required<CustomerEstimate>();
  readonly token = input.required<string>();
  readonly declinePressed = output();
  /** What stands here is not what stands at the shop any more. */
  readonly reloadPressed = output();

  private readonly store = inject(Store);
  protected readonly answer = this.store.selectSignal(customerPageFeature.selectAnswer);
  protected readonly form = inject(NonNullableFormBuilder).group({ name: '', agreed: false });

  protected submit(element: HTMLFormElement): void {
    const typed = checkForm(this.form, acceptEstimateSchema.pick({ name: true, agreed: true }));
    if (!typed) {
      focusFirstInvalid(element);
      return;
    }
    const { document, documentHash } = this.estimate();
    const acceptance = { ...typed, revisionId: document.revisionId, documentHash };
    this.store.dispatch(CustomerScreen.accepted({ token: this.token(), acceptance }));
  }
}
