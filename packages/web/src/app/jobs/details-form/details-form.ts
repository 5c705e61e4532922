import { ChangeDetectionStrategy, Component, effect, inject } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatCheckbox } from '@angular/material/checkbox';
import {
  MAT_DIALOG_DATA,
  MatDialogActions,
  MatDialogContent,
  MatDialogRef,
  MatDialogTitle,
} from '@angular/material/dialog';
import { MatError, MatFormField, MatLabel } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { updateJobSchema, type Job } from '@bookmatch/common/jobs/jobs-contract';
import { Store } from '@ngrx/store';
import { checkForm } from '../../ui/form-errors/check-form';
import { ErrorOf } from '../../ui/form-errors/error-of';
import { focusFirstInvalid, FormErrors } from '../../ui/form-errors/form-errors';
import { DayInput } from '../../ui/day-input/day-input';
import { JobsPage } from '../state/jobs.actions';
import { selectJob, selectSave } from '../state/jobs.selectors';

/** Changes a job's own fields. After a conflict the form keeps what was typed and saves over the newer version. */
@Component({
  selector: 'bm-details-form',
  imports: [
    DayInput,
    ErrorOf,
    FormErrors,
    MatButton,
    MatCheckbox,
    MatDialogActions,
    MatDialogContent,
    MatDialogTitle,
    MatError,
    MatFormField,
    MatInput,
    MatLabel,
    ReactiveFormsModule,
  ],
  templateUrl: './details-form.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class DetailsForm {
  private readonly store = inject(Store);
  private readonly builder = inject(NonNullableFormBuilder);
  private readonly opened = inject<Job>(MAT_DIALOG_DATA);
  protected readonly dialog = inject<MatDialogRef<DetailsForm>>(MatDialogRef);
  private readonly job = this.store.selectSignal(selectJob(this.opened.id));
  protected readonly save = this.store.selectSignal(selectSave);
  protected readonly form = this.builder.group({
    title: this.opened.title,
    installOn: this.builder.control<string | null>(this.opened.installOn),
    openToCrew: this.opened.openToCrew,
    notes: this.opened.notes,
  });

  constructor() {
    this.store.dispatch(JobsPage.formOpened());
    effect(() => {
      if (this.save().status === 'saved') this.dialog.close();
    });
  }

  protected submit(element: HTMLFormElement): void {
    const fields = checkForm(this.form, updateJobSchema);
    if (!fields) {
      focusFirstInvalid(element);
      return;
    }
    const { id, version } = this.job() ?? this.opened;
    this.store.dispatch(JobsPage.editSubmitted({ job: { id, version }, fields }));
  }
}
