import { ChangeDetectionStrategy, Component, effect, inject } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatCheckbox } from '@angular/material/checkbox';
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
import {
  COST_CATEGORY_NAMES,
  TIME_CATEGORIES,
  type TimeCategory,
} from '@bookmatch/common/estimates/cost-categories';
import {
  createOperationSchema,
  updateOperationSchema,
  type Operation,
} from '@bookmatch/common/shops/operations-contract';
import { Store } from '@ngrx/store';
import { checkForm } from '../../ui/form-errors/check-form';
import { ErrorOf } from '../../ui/form-errors/error-of';
import { focusFirstInvalid, FormErrors } from '../../ui/form-errors/form-errors';
import { MoneyInput } from '../../ui/money-input/money-input';
import { OperationsPage } from '../state/operations.actions';
import { operationsFeature } from '../state/operations.state';

/** Adds an operation, or changes the one it was opened with. */
@Component({
  selector: 'bm-operation-dialog',
  imports: [
    ErrorOf,
    FormErrors,
    MatButton,
    MatCheckbox,
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
  templateUrl: './operation-dialog.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class OperationDialog {
  private readonly store = inject(Store);
  private readonly builder = inject(NonNullableFormBuilder);
  private readonly dialog = inject<MatDialogRef<OperationDialog>>(MatDialogRef);
  protected readonly operation = inject<Operation | null>(MAT_DIALOG_DATA);
  protected readonly save = this.store.selectSignal(operationsFeature.selectDialog);
  protected readonly categories = TIME_CATEGORIES.map((value) => ({
    value,
    name: COST_CATEGORY_NAMES[value],
  }));
  protected readonly form = this.builder.group({
    name: this.operation?.name ?? '',
    costCategory: this.builder.control<TimeCategory>(this.operation?.costCategory ?? 'labor'),
    defaultRateCentsPerHour: this.builder.control<number | null>(
      this.operation?.defaultRateCentsPerHour ?? null,
    ),
    // Whether it belongs to a job is said once: time clocked to it would change its meaning.
    onJob: { value: this.operation?.onJob ?? true, disabled: this.operation !== null },
  });

  constructor() {
    this.store.dispatch(OperationsPage.dialogOpened());
    effect(() => {
      if (this.save().status === 'saved') this.dialog.close();
    });
  }

  protected submit(element: HTMLFormElement): void {
    if (!(this.operation ? this.change(this.operation) : this.add())) focusFirstInvalid(element);
  }

  private add(): boolean {
    const fields = checkForm(this.form, createOperationSchema);
    if (fields) this.store.dispatch(OperationsPage.addSubmitted({ fields }));
    return fields !== null;
  }

  private change(operation: Operation): boolean {
    const fields = checkForm(this.form, {
      safeParse: ({ onJob: _fixed, ...rest }: ReturnType<typeof this.form.getRawValue>) =>
        updateOperationSchema.safeParse(rest),
    });
    if (fields) this.store.dispatch(OperationsPage.changeSubmitted({ operation, fields }));
    return fields !== null;
  }
}
