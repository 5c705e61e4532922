import { ChangeDetectionStrategy, Component, computed, effect, inject } from '@angular/core';
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
import { startEstimateSchema, type Lead } from '@bookmatch/common/leads/leads-contract';
import { Store } from '@ngrx/store';
import { checkForm } from '../../ui/form-errors/check-form';
import { ErrorOf } from '../../ui/form-errors/error-of';
import { focusFirstInvalid, FormErrors } from '../../ui/form-errors/form-errors';
import { LeadsPage } from '../state/leads.actions';
import { selectLead, selectSave } from '../state/leads.selectors';

/** Starts an estimate for the lead's customer, at its site. */
@Component({
  selector: 'bm-start-estimate',
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
    <h2 mat-dialog-title>Start an estimate</h2>
    <form #element novalidate [formGroup]="form" (ngSubmit)="submit(element)">
      <mat-dialog-content>
        <bm-form-errors [form]="form" [problem]="save().problem" />
        <div class="bm-entry">
          <p class="bm-quiet">
            For {{ lead().customerName }}{{ lead().siteName ? ', ' + lead().siteName : '' }}
          </p>
          <mat-form-field>
            <mat-label>Title</mat-label>
            <input matInput autocomplete="off" formControlName="title" required />
            <mat-error [bmErrorOf]="form.controls.title" />
          </mat-form-field>
        </div>
      </mat-dialog-content>
      <mat-dialog-actions>
        <button matButton type="button" (click)="dialog.close()">Cancel</button>
        <button matButton="filled" type="submit" [disabled]="save().status === 'saving'">
          Start the estimate
        </button>
      </mat-dialog-actions>
    </form>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class StartEstimateForm {
  private readonly store = inject(Store);
  private readonly opened = inject<Lead>(MAT_DIALOG_DATA);
  protected readonly dialog = inject<MatDialogRef<StartEstimateForm>>(MatDialogRef);
  private readonly newest = this.store.selectSignal(selectLead(this.opened.id));
  protected readonly lead = computed(() => this.newest() ?? this.opened);
  protected readonly save = this.store.selectSignal(selectSave('estimate'));
  protected readonly form = inject(NonNullableFormBuilder).group({ title: this.opened.title });

  constructor() {
    this.store.dispatch(LeadsPage.formOpened({ form: 'estimate' }));
    effect(() => {
      if (this.save().status === 'saved') this.dialog.close();
    });
  }

  protected submit(element: HTMLFormElement): void {
    const estimate = checkForm(this.form, startEstimateSchema);
    if (estimate) this.store.dispatch(LeadsPage.estimateSubmitted({ lead: this.lead(), estimate }));
    else focusFirstInvalid(element);
  }
}
