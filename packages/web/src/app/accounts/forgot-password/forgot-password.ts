import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatError, MatFormField, MatLabel } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { RouterLink } from '@angular/router';
import { requestPasswordResetSchema } from '@bookmatch/common/accounts/accounts-contract';
import { Submission } from '../../platform/forms/submission';
import { checkForm } from '../../ui/form-errors/check-form';
import { ErrorOf } from '../../ui/form-errors/error-of';
import { focusFirstInvalid, FormErrors } from '../../ui/form-errors/form-errors';
import { AccountsApiClient } from '../accounts-api';
import { EntryFrame } from '../entry-frame/entry-frame';

/** Asks for a letter; says the same whether the address is known or not. */
@Component({
  selector: 'bm-forgot-password',
  imports: [
    EntryFrame,
    ErrorOf,
    FormErrors,
    MatButton,
    MatError,
    MatFormField,
    MatInput,
    MatLabel,
    ReactiveFormsModule,
    RouterLink,
  ],
  template: `
    <bm-entry-frame heading="Choose a new password">
      @if (sentTo(); as email) {
        <p role="status">
          If <strong>{{ email }}</strong> has an account, a letter with a link is on its way. The link works
          for an hour.
        </p>
      } @else {
        <form #element class="bm-entry" novalidate [formGroup]="form" (ngSubmit)="submit(element)">
          <bm-form-errors [form]="form" [problem]="submission.problem()" />
          <mat-form-field>
            <mat-label>E-mail</mat-label>
            <input matInput type="email" autocomplete="username" formControlName="email" />
            <mat-error [bmErrorOf]="form.controls.email" />
          </mat-form-field>
          <button matButton="filled" type="submit" [disabled]="submission.busy()">Send me a link</button>
        </form>
      }
      <ng-container bmEntryFoot><a routerLink="/sign-in">Back to sign in</a></ng-container>
    </bm-entry-frame>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ForgotPassword {
  private readonly accounts = inject(AccountsApiClient);
  protected readonly form = inject(NonNullableFormBuilder).group({ email: '' });
  protected readonly submission = new Submission();
  protected readonly sentTo = signal<string | null>(null);

  protected submit(element: HTMLFormElement): void {
    const fields = checkForm(this.form, requestPasswordResetSchema);
    if (fields)
      this.submission.run(this.accounts.requestPasswordReset(fields), () => this.sentTo.set(fields.email));
    else focusFirstInvalid(element);
  }
}
