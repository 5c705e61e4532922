import { ChangeDetectionStrategy, Component, effect, inject } from '@angular/core';
import { FormControl, FormGroup, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import {
  MAT_DIALOG_DATA,
  MatDialogActions,
  MatDialogClose,
  MatDialogContent,
  MatDialogRef,
  MatDialogTitle,
} from '@angular/material/dialog';
import {
  MatError,
  MatFormField,
  MatHint,
  MatLabel,
  MatPrefix,
  MatSuffix,
} from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { setLaborCostSchema, type Member } from '@bookmatch/common/shops/members-contract';
import { Store } from '@ngrx/store';
import { checkForm } from '../../ui/form-errors/check-form';
import { ErrorOf } from '../../ui/form-errors/error-of';
import { focusFirstInvalid, FormErrors } from '../../ui/form-errors/form-errors';
import { MoneyInput } from '../../ui/money-input/money-input';
import { MembersPage } from '../state/members.actions';
import { membersFeature } from '../state/members.state';

/** Says what an hour of a member costs the shop. */
@Component({
  selector: 'bm-labor-cost-dialog',
  imports: [
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
    MatPrefix,
    MatSuffix,
    MoneyInput,
    ReactiveFormsModule,
  ],
  template: `
    <h2 mat-dialog-title>What an hour of {{ member.name }} costs</h2>
    <form #element novalidate [formGroup]="form" (ngSubmit)="submit(element)">
      <mat-dialog-content>
        <bm-form-errors [form]="form" [problem]="save().problem" />
        <div class="bm-entry">
          <p class="bm-quiet">
            Wages, payroll tax, insurance and time off together. It prices the hours clocked from now on; time
            already clocked keeps its cost. It is not what payroll pays by.
          </p>
          <mat-form-field floatLabel="always">
            <mat-label>Cost of an hour</mat-label>
            <span matTextPrefix>$</span>
            <input matInput bmMoneyInput formControlName="laborCostCentsPerHour" />
            <span matTextSuffix>&nbsp;an hour</span>
            <mat-hint>Leave it empty when you do not know yet.</mat-hint>
            <mat-error [bmErrorOf]="form.controls.laborCostCentsPerHour" />
          </mat-form-field>
        </div>
      </mat-dialog-content>
      <mat-dialog-actions>
        <button matButton type="button" mat-dialog-close>Cancel</button>
        <button matButton="filled" type="submit" [disabled]="save().status === 'saving'">Save</button>
      </mat-dialog-actions>
    </form>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LaborCostDialog {
  private readonly store = inject(Store);
  private readonly dialog = inject<MatDialogRef<LaborCostDialog>>(MatDialogRef);
  protected readonly member = inject<Member>(MAT_DIALOG_DATA);
  protected readonly save = this.store.selectSignal(membersFeature.selectDialog);
  protected readonly form = new FormGroup({
    laborCostCentsPerHour: new FormControl<number | null>(this.member.laborCostCentsPerHour ?? null),
  });

  constructor() {
    this.store.dispatch(MembersPage.dialogOpened());
    effect(() => {
      if (this.save().status === 'saved') this.dialog.close();
    });
  }

  protected submit(element: HTMLFormElement): void {
    const fields = checkForm(this.form, setLaborCostSchema);
    if (fields) this.store.dispatch(MembersPage.laborCostSet({ member: this.member, ...fields }));
    else focusFirstInvalid(element);
  }
}
