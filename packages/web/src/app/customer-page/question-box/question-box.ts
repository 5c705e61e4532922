import { ChangeDetectionStrategy, Component, effect, inject, input, untracked } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatError, MatFormField, MatLabel } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { askQuestionSchema, type Question } from '@bookmatch/common/customer-page/questions-contract';
import { Store } from '@ngrx/store';
import { checkForm } from '../../ui/form-errors/check-form';
import { ErrorOf } from '../../ui/form-errors/error-of';
import { focusFirstInvalid, FormErrors } from '../../ui/form-errors/form-errors';
import { DateTextPipe } from '../../ui/formats/date-text.pipe';
import { CustomerScreen } from '../state/customer-page.actions';
import { customerPageFeature } from '../state/customer-page.state';

/** What was asked and answered, and room for one more question. */
@Component({
  selector: 'bm-question-box',
  imports: [
    DateTextPipe,
    ErrorOf,
    FormErrors,
    MatButton,
    MatError,
    MatFormField,
    MatInput,
    MatLabel,
    ReactiveFormsModule,
  ],
  templateUrl: './question-box.html',
  styleUrl: './question-box.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class QuestionBox {
  readonly questions = input.required<readonly Question[]>();
  readonly shopName = input.required<string>();
  readonly token = input.required<string>();

  private readonly store = inject(Store);
  protected readonly sending = this.store.selectSignal(customerPageFeature.selectQuestion);
  protected readonly form = inject(NonNullableFormBuilder).group({ body: '' });

  constructor() {
    effect(() => {
      if (this.sending().status === 'saved') untracked(() => this.form.reset());
    });
  }

  protected submit(element: HTMLFormElement): void {
    const asked = checkForm(this.form, askQuestionSchema);
    if (asked) this.store.dispatch(CustomerScreen.asked({ token: this.token(), ...asked }));
    else focusFirstInvalid(element);
  }
}
