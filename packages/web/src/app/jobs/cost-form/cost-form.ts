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
import { MatError, MatFormField, MatLabel, MatPrefix } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { MatOption, MatSelect } from '@angular/material/select';
import { dateIn } from '@bookmatch/common/calendar/shop-dates';
import {
  COST_CATEGORIES,
  COST_CATEGORY_NAMES,
  type CostCategory,
} from '@bookmatch/common/estimates/cost-categories';
import { createJobCostSchema } from '@bookmatch/common/jobs/job-costs-contract';
import { Store } from '@ngrx/store';
import { checkForm } from '../../ui/form-errors/check-form';
import { ErrorOf } from '../../ui/form-errors/error-of';
import { focusFirstInvalid, FormErrors } from '../../ui/form-errors/form-errors';
import { SHOP_ZONE } from '../../ui/formats/shop-settings';
import { MoneyInput } from '../../ui/money-input/money-input';
import { JobsPage } from '../state/jobs.actions';
import { selectCostSave } from '../state/jobs.selectors';

/** Enters a cost of the job whose id it is opened with. */
@Component({
  selector: 'bm-cost-form',
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
    MatOption,
    MatPrefix,
    MatSelect,
    MoneyInput,
    ReactiveFormsModule,
  ],
  templateUrl: './cost-form.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CostForm {
  private readonly store = inject(Store);
  private readonly builder = inject(NonNullableFormBuilder);
  private readonly jobId = inject<string>(MAT_DIALOG_DATA);
  protected readonly dialog = inject<MatDialogRef<CostForm>>(MatDialogRef);
  protected readonly save = this.store.selectSignal(selectCostSave);
  protected readonly categories = COST_CATEGORIES.map((value) => ({
    value,
    name: COST_CATEGORY_NAMES[value],
  }));
  protected readonly today = dateIn(inject(SHOP_ZONE)(), new Date().toISOString());
  protected readonly form = this.builder.group({
    category: this.builder.control<CostCategory>('material'),
    description: '',
    amountCents: this.builder.control<number | null>(null),
    onDate: this.today,
    supplier: '',
  });

  constructor() {
    this.store.dispatch(JobsPage.costFormOpened());
    effect(() => {
      if (this.save().status === 'saved') this.dialog.close();
    });
  }

  protected submit(element: HTMLFormElement): void {
    const cost = checkForm(this.form, createJobCostSchema);
    if (!cost) {
      focusFirstInvalid(element);
      return;
    }
    this.store.dispatch(JobsPage.costSubmitted({ jobId: this.jobId, cost }));
  }
}
