import { ChangeDetectionStrategy, Component, inject, input, output, signal } from '@angular/core';
import { FormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatError, MatFormField, MatLabel } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { signInSchema } from '@bookmatch/common/accounts/accounts-contract';
import type { Problem } from '@bookmatch/common/problems/problem';
import { toProblem } from '../../platform/api/api-problem';
import { checkForm } from '../../ui/form-errors/check-form';
import { ErrorOf } from '../../ui/form-errors/error-of';
import { focusFirstInvalid, FormErrors } from '../../ui/form-errors/form-errors';
import { AccountsApi } from '../accounts-api';

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
  readonly done = output();

  private readonly accounts = inject(AccountsApi);
  protected readonly form = inject(FormBuilder).nonNullable.group({ email: '', password: '' });
  protected readonly problem = signal<Problem | null>(null);
  protected readonly busy = signal(false);

  protected submit(element: HTMLFormElement): void {
    if (this.email()) this.form.patchValue({ email: this.email() });
    const credentials = checkForm(this.form, signInSchema);
    if (!credentials) {
      focusFirstInvalid(element);
      return;
    }
    this.busy.set(true);
    this.problem.set(null);
    this.accounts.signIn(credentials).subscribe({
      next: () => this.done.emit(),
      error: (error: unknown) => {
        this.busy.set(false);
        this.problem.set(toProblem(error));
      },
    });
  }
}
