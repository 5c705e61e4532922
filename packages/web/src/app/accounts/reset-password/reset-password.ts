import { ChangeDetectionStrategy, Component, inject, input } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatError, MatFormField, MatHint, MatLabel } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { Router, RouterLink } from '@angular/router';
import { MIN_PASSWORD_LENGTH, resetPasswordSchema } from '@bookmatch/common/accounts/accounts-contract';
import { Submission } from '../../platform/forms/submission';
import { checkForm } from '../../ui/form-errors/check-form';
import { ErrorOf } from '../../ui/form-errors/error-of';
import { focusFirstInvalid, FormErrors } from '../../ui/form-errors/form-errors';
import { AccountsApiClient } from '../accounts-api';
import { EntryFrame } from '../entry-frame/entry-frame';

/** Where the letter's link leads. */
@Component({
  selector: 'bm-reset-password',
  imports: [
    EntryFrame,
    ErrorOf,
    FormErrors,
    MatButton,
    MatError,
    MatFormField,
    MatHint,
    MatInput,
    MatLabel,
    ReactiveFormsModule,
    RouterLink,
  ],
  template: `
    <bm-entry-frame heading="Choose a new password">
      <form #element class="bm-entry" novalidate [formGroup]="form" (ngSubmit)="submit(element)">
        <bm-form-errors [form]="form" [problem]="submission.problem()" />
        <mat-form-field>
          <mat-label>New password</mat-label>
          <input matInput type="password" autocomplete="new-password" formControlName="password" />
          <mat-hint>At least {{ minLength }} characters. A few words do well.</mat-hint>
          <mat-error [bmErrorOf]="form.controls.password" />
        </mat-form-field>
        <button matButton="filled" type="submit" [disabled]="submission.busy()">Set the password</button>
      </form>
      <ng-container bmEntryFoot><a routerLink="/forgot-password">Ask for another link</a></ng-container>
    </bm-entry-frame>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ResetPassword {
  /** From the address. */
  readonly token = input('');

  private readonly accounts = inject(AccountsApiClient);
  private readonly router = inject(Router);
  protected readonly minLength = MIN_PASSWORD_LENGTH;
  protected readonly form = inject(NonNullableFormBuilder).group({ token: '', password: '' });
  protected readonly submission = new Submission();

  protected submit(element: HTMLFormElement): void {
    this.form.patchValue({ token: this.token() });
    const fields = checkForm(this.form, resetPasswordSchema);
    if (fields)
      this.submission.run(this.accounts.resetPassword(fields), () => {
        void this.router.navigate(['/sign-in'], { queryParams: { reset: '' } });
      });
    else focusFirstInvalid(element);
  }
}
