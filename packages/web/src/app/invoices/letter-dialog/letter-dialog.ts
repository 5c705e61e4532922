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
import { MatError, MatFormField, MatLabel } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { INVOICE_DOCUMENT_NAMES } from '@bookmatch/common/invoices/invoice-words';
import { sendDocumentSchema } from '@bookmatch/common/invoices/invoices-contract';
import { Store } from '@ngrx/store';
import { checkForm } from '../../ui/form-errors/check-form';
import { ErrorOf } from '../../ui/form-errors/error-of';
import { focusFirstInvalid, FormErrors } from '../../ui/form-errors/form-errors';
import type { LetterSubject } from '../invoices-api';
import { InvoicesPage } from '../state/invoices.actions';
import { selectSave } from '../state/invoices.selectors';

export type LetterQuestion = { invoiceId: string; subject: LetterSubject; to: string };

/** To whom a receipt or a credit note goes; the letter has words of its own. */
@Component({
  selector: 'bm-letter-dialog',
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
    ReactiveFormsModule,
  ],
  template: `
    <h2 mat-dialog-title>Send the {{ name.toLowerCase() }}</h2>
    <form #element novalidate [formGroup]="form" (ngSubmit)="submit(element)">
      <mat-dialog-content>
        <bm-form-errors [form]="form" [problem]="save().problem" />
        <div class="bm-entry">
          <mat-form-field>
            <mat-label>To</mat-label>
            <input matInput type="email" autocomplete="off" formControlName="to" required />
            <mat-error [bmErrorOf]="form.controls.to" />
          </mat-form-field>
        </div>
      </mat-dialog-content>
      <mat-dialog-actions>
        <button matButton type="button" (click)="dialog.close()">Cancel</button>
        <button matButton="filled" type="submit" [disabled]="save().status === 'saving'">Send</button>
      </mat-dialog-actions>
    </form>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LetterDialog {
  private readonly store = inject(Store);
  private readonly question = inject<LetterQuestion>(MAT_DIALOG_DATA);
  protected readonly dialog = inject<MatDialogRef<LetterDialog>>(MatDialogRef);
  protected readonly save = this.store.selectSignal(selectSave);
  protected readonly name = INVOICE_DOCUMENT_NAMES[this.question.subject.document];
  protected readonly form = inject(NonNullableFormBuilder).group({ to: this.question.to });

  constructor() {
    this.store.dispatch(InvoicesPage.formOpened());
    effect(() => {
      if (this.save().status === 'saved') this.dialog.close();
    });
  }

  protected submit(element: HTMLFormElement): void {
    const letter = checkForm(this.form, sendDocumentSchema);
    if (!letter) {
      focusFirstInvalid(element);
      return;
    }
    const { invoiceId, subject } = this.question;
    this.store.dispatch(InvoicesPage.letterSubmitted({ invoiceId, subject, to: letter.to }));
  }
}
