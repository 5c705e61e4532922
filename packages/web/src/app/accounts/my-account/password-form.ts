import { ChangeDetectionStrategy, Component, inject, viewChild } from '@angular/core';
import { FormGroupDirective, NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatError, MatFormField, MatHint, MatLabel } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { changePasswordSchema, MIN_PASSWORD_LENGTH } from '@bookmatch/common/accounts/accounts-contract';
import { Notices } from '../../platform/page/notices';
import { Submission } from '../../platform/forms/submission';
import { checkForm } from '../../ui/form-errors/check-form';
import { ErrorOf } from '../../ui/form-errors/error-of';
import { focusFirstInvalid, FormErrors } from '../../ui/form-errors/form-errors';
import { Panel } from '../../ui/panel/panel';
import { AccountsApiClient } from '../accounts-api';

@Component({
  selector: 'bm-password-form',
  imports: [
    ErrorOf,
    FormErrors,
    MatButton,
    MatError,
    MatFormField,
    MatHint,
    MatInput,
    MatLabel,
    Panel,
    ReactiveFormsModule,
  ],
  template: `
    <bm-panel heading="Password">
      <form #element class="bm-entry" novalidate [formGroup]="form" (ngSubmit)="submit(element)">
        <bm-form-errors [form]="form" [problem]="submission.problem()" />
        <mat-form-field>
          <mat-label>Current password</mat-label>
          <input matInput type="password" autocomplete="current-password" formControlName="currentPassword" />
          <mat-error [bmErrorOf]="form.controls.currentPassword" />
        </mat-form-field>
        <mat-form-field>
          <mat-label>New password</mat-label>
          <input matInput type="password" autocomplete="new-password" formControlName="newPassword" />
          <mat-hint>At least {{ minLength }} characters. A few words do well.</mat-hint>
          <mat-error [bmErrorOf]="form.controls.newPassword" />
        </mat-form-field>
        <p class="bm-quiet">Changing it signs you out everywhere else.</p>
        <div class="bm-form-actions">
          <button matButton="outlined" type="submit" [disabled]="submission.busy()">Change password</button>
        </div>
      </form>
    </bm-panel>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PasswordForm {
  private readonly accounts = inject(AccountsApiClient);
  private readonly notices = inject(Notices);
  private readonly directive = viewChild.required(FormGroupDirective);
  protected readonly minLength = MIN_PASSWORD_LENGTH;
  protected readonly form = inject(NonNullableFormBuilder).group({ currentPassword: '', newPassword: '' });
  protected readonly submission = new Submission();

  protected submit(element: HTMLFormElement): void {
    const fields = checkForm(this.form, changePasswordSchema);
    if (!fields) {
      focusFirstInvalid(element);
      return;
    }
    this.submission.run(this.accounts.changePassword(fields), () => {
      // Through the directive, so that the emptied fields do not count as sent and empty.
      this.directive().resetForm();
      this.notices.say('Password changed.');
    });
  }
}
