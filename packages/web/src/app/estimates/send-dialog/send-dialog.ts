import { ChangeDetectionStrategy, Component, computed, effect, inject } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import {
  MAT_DIALOG_DATA,
  MatDialogActions,
  MatDialogClose,
  MatDialogContent,
  MatDialogRef,
  MatDialogTitle,
} from '@angular/material/dialog';
import { MatError, MatFormField, MatHint, MatLabel } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { sendEstimateSchema } from '@bookmatch/common/estimates/estimates-contract';
import { Store } from '@ngrx/store';
import { checkForm } from '../../ui/form-errors/check-form';
import { ErrorOf } from '../../ui/form-errors/error-of';
import { focusFirstInvalid, FormErrors } from '../../ui/form-errors/form-errors';
import { DateTextPipe } from '../../ui/formats/date-text.pipe';
import { MoneyPipe } from '../../ui/formats/money.pipe';
import { EstimatesPage } from '../state/estimates.actions';
import { selectDraft, selectEstimate, selectSend } from '../state/estimates.selectors';

export type SendSubject = { estimateId: string };

/** Sends the current revision: to whom, with what words. Says first what still keeps it from being sent. */
@Component({
  selector: 'bm-send-dialog',
  imports: [
    DateTextPipe,
    ErrorOf,
    FormErrors,
    MatButton,
    MatDialogActions,
    MatDialogClose,
    MatDialogContent,
    MatDialogTitle,
    MatError,
    MatFormField,
    MatHint,
    MatInput,
    MatLabel,
    MoneyPipe,
    ReactiveFormsModule,
  ],
  templateUrl: './send-dialog.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SendDialog {
  private readonly subject = inject<SendSubject>(MAT_DIALOG_DATA);
  private readonly dialog = inject<MatDialogRef<SendDialog>>(MatDialogRef);
  private readonly store = inject(Store);
  protected readonly estimate = this.store.selectSignal(selectEstimate(this.subject.estimateId));
  protected readonly send = this.store.selectSignal(selectSend);
  private readonly draft = this.store.selectSignal(selectDraft);
  protected readonly refusals = computed(() => this.estimate()?.currentRevision.sendRefusals ?? []);
  /** Only what is kept is sent, so a save that is under way is waited for. */
  protected readonly busy = computed(() => [this.send().status, this.draft().status].includes('saving'));
  protected readonly form = inject(NonNullableFormBuilder).group({ to: '', message: '' });

  constructor() {
    this.store.dispatch(EstimatesPage.sendOpened());
    const { sends = [], customer } = this.estimate() ?? {};
    this.form.patchValue({ to: sends.at(-1)?.to ?? customer?.email ?? '' });
    effect(() => {
      if (this.send().status === 'saved') this.dialog.close();
    });
  }

  protected submit(element: HTMLFormElement): void {
    const fields = checkForm(this.form, sendEstimateSchema.omit({ revisionVersion: true }));
    if (!fields) focusFirstInvalid(element);
    else this.store.dispatch(EstimatesPage.sendSubmitted({ ...this.subject, ...fields }));
  }
}
