import { ChangeDetectionStrategy, Component, inject, input } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton, MatIconButton } from '@angular/material/button';
import { MatCheckbox } from '@angular/material/checkbox';
import { MatError, MatFormField, MatLabel, MatPrefix, MatSuffix } from '@angular/material/form-field';
import { MatIcon } from '@angular/material/icon';
import { MatInput } from '@angular/material/input';
import { MAX_BILLING_STAGES } from '@bookmatch/common/estimates/billing-schedule-contract';
import { ErrorOf } from '../../ui/form-errors/error-of';
import { MoneyInput } from '../../ui/money-input/money-input';
import { stageForm, type ScheduleForm } from './billing-schedule-form';

/** The stages a new job is billed by, each a row: its name, its share, when it is due. */
@Component({
  selector: 'bm-billing-schedule-fields',
  imports: [
    ErrorOf,
    MatButton,
    MatCheckbox,
    MatError,
    MatFormField,
    MatIcon,
    MatIconButton,
    MatInput,
    MatLabel,
    MatPrefix,
    MatSuffix,
    MoneyInput,
    ReactiveFormsModule,
  ],
  templateUrl: './billing-schedule-fields.html',
  styleUrl: './billing-schedule-fields.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class BillingScheduleFields {
  readonly form = input.required<ScheduleForm>();
  private readonly builder = inject(NonNullableFormBuilder);
  protected readonly most = MAX_BILLING_STAGES;

  protected add(): void {
    this.form().push(stageForm(this.builder));
    this.form().markAsDirty();
  }

  protected remove(index: number): void {
    this.form().removeAt(index);
    this.form().markAsDirty();
  }

  protected move(index: number, by: -1 | 1): void {
    const stage = this.form().at(index);
    this.form().removeAt(index);
    this.form().insert(index + by, stage);
    this.form().markAsDirty();
  }
}
