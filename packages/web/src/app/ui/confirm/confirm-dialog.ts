import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { FormControl, FormGroup, ReactiveFormsModule, Validators } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import {
  MAT_DIALOG_DATA,
  MatDialogActions,
  MatDialogClose,
  MatDialogContent,
  MatDialogRef,
  MatDialogTitle,
} from '@angular/material/dialog';
import { MatError, MatFormField, MatLabel } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import type { ConfirmAnswer, ConfirmQuestion } from './confirm-question';

@Component({
  selector: 'bm-confirm-dialog',
  imports: [
    MatButton,
    MatDialogActions,
    MatDialogClose,
    MatDialogContent,
    MatDialogTitle,
    MatError,
    MatFormField,
    MatInput,
    MatLabel,
    ReactiveFormsModule,
  ],
  template: `
    <h2 mat-dialog-title>{{ question.title }}</h2>
    <form [formGroup]="form" (ngSubmit)="agree()">
      <mat-dialog-content>
        <p>{{ question.text }}</p>
        @if (question.reason; as asked) {
          <mat-form-field class="reason">
            <mat-label>{{ asked.label }}</mat-label>
            <textarea matInput rows="2" maxlength="500" formControlName="reason"></textarea>
            <mat-error>Say why, in a few words.</mat-error>
          </mat-form-field>
        }
      </mat-dialog-content>
      <mat-dialog-actions>
        <button matButton type="button" [mat-dialog-close]="undefined">
          {{ question.cancel ?? 'Cancel' }}
        </button>
        <button matButton="filled" type="submit" [class.harm]="question.tone === 'harm'">
          {{ question.action }}
        </button>
      </mat-dialog-actions>
    </form>
  `,
  styleUrl: './confirm-dialog.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ConfirmDialog {
  protected readonly question = inject<ConfirmQuestion>(MAT_DIALOG_DATA);
  private readonly dialog = inject<MatDialogRef<ConfirmDialog, ConfirmAnswer>>(MatDialogRef);
  protected readonly form = new FormGroup({
    reason: new FormControl('', {
      nonNullable: true,
      validators: this.question.reason?.required ? [Validators.required, Validators.pattern(/\S/)] : [],
    }),
  });

  protected agree(): void {
    this.form.markAllAsTouched();
    if (this.form.valid) this.dialog.close({ reason: this.form.getRawValue().reason.trim() });
  }
}
