import { ChangeDetectionStrategy, Component, inject, input, output } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatError, MatFormField, MatLabel } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { signInSchema, type Session } from '@bookmatch/common/accounts/accounts-contract';
import { Submission } from '../../platform/forms/submission';
import { checkForm } from '../../ui/form-errors/check-form';
import { ErrorOf } from '../../ui/form-errors/error-of';
import { focusFirstInvalid, FormErrors } from '../../ui/form-errors/form-errors';
import { AccountsApiClient } from '../accounts-api';

/** E-mail and password; used by the page of its own and in place when a session ended. */
@Component({
  selector: 'bm-sign-in-form',
  imports: [ErrorOf, FormErrors, MatButton, MatError, MatFormField, MatInput, MatLabel, ReactiveFormsModule],
  templateUrl: './sign-in-form.html',
  styleUrl: './sign-in-form.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SignInForm {
  /** Known already when the person signs in again. */
  readonly email = input('');
  readonly done = output<Session>();

  private readonly accounts = inject(AccountsApiClient);
  protected readonly form = inject(NonNullableFormBuilder).group({ email: '', password: '' });
  protected readonly submission = new Submission();

  protected submit(element: HTMLFormElement): void {
    if (this.email()) this.form.patchValue({ email: this.email() });
    const credentials = checkForm(this.form, signInSchema);
    if (credentials)
      this.submission.run(this.accounts.signIn(credentials), (session) => this.done.emit(session));
    else focusFirstInvalid(element);
  }
}
