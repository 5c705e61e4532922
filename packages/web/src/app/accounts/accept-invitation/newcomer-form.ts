import { ChangeDetectionStrategy, Component, inject, input, output } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatError, MatFormField, MatHint, MatLabel } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { MIN_PASSWORD_LENGTH, signUpSchema } from '@bookmatch/common/accounts/accounts-contract';
import { checkForm } from '../../ui/form-errors/check-form';
import { ErrorOf } from '../../ui/form-errors/error-of';
import { focusFirstInvalid } from '../../ui/form-errors/form-errors';

const newcomerSchema = signUpSchema.pick({ name: true, password: true });

/** The two things asked of somebody new. */
@Component({
  selector: 'bm-newcomer-form',
  imports: [ErrorOf, MatButton, MatError, MatFormField, MatHint, MatInput, MatLabel, ReactiveFormsModule],
  template: `
    <form #element class="bm-entry" novalidate [formGroup]="form" (ngSubmit)="submit(element)">
      <mat-form-field>
        <mat-label>Your name</mat-label>
        <input matInput autocomplete="name" formControlName="name" />
        <mat-error [bmErrorOf]="form.controls.name" />
      </mat-form-field>
      <mat-form-field>
        <mat-label>Password</mat-label>
        <input matInput type="password" autocomplete="new-password" formControlName="password" />
        <mat-hint>At least {{ minLength }} characters. A few words do well.</mat-hint>
        <mat-error [bmErrorOf]="form.controls.password" />
      </mat-form-field>
      <button matButton="filled" type="submit" [disabled]="busy()">Join</button>
    </form>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NewcomerForm {
  readonly busy = input(false);
  readonly ready = output<{ name: string; password: string }>();
  protected readonly minLength = MIN_PASSWORD_LENGTH;
  protected readonly form = inject(NonNullableFormBuilder).group({ name: '', password: '' });

  protected submit(element: HTMLFormElement): void {
    const fields = checkForm(this.form, newcomerSchema);
    if (fields) this.ready.emit(fields);
    else focusFirstInvalid(element);
  }
}
