import {
  ChangeDetectionStrategy,
  Component,
  inject,
  input,
  effect,
  signal,
  untracked,
  viewChild,
} from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { NonNullableFormBuilder, ReactiveFormsModule, type AbstractControl } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatCheckbox } from '@angular/material/checkbox';
import {
  MatError,
  MatFormField,
  MatHint,
  MatLabel,
  MatPrefix,
  MatSuffix,
} from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { MatOption, MatSelect } from '@angular/material/select';
import { RouterLink } from '@angular/router';
import type { CustomerWithSites, Site } from '@bookmatch/common/customers/customers-contract';
import { COST_CATEGORIES, COST_CATEGORY_NAMES } from '@bookmatch/common/estimates/cost-categories';
import { createJobSchema } from '@bookmatch/common/jobs/jobs-contract';
import type { Operation } from '@bookmatch/common/shops/operations-contract';
import { Store } from '@ngrx/store';
import { catchError, of } from 'rxjs';
import { CustomerChoice } from '../../customers/customers-public';
import { placeFieldProblems } from '../../ui/form-errors/field-problems';
import { ErrorOf } from '../../ui/form-errors/error-of';
import { focusFirstInvalid, FormErrors } from '../../ui/form-errors/form-errors';
import { MoneyInput } from '../../ui/money-input/money-input';
import { PageHead } from '../../ui/page-head/page-head';
import { Panel } from '../../ui/panel/panel';
import { warnBeforeUnload, type HasUnsavedChanges } from '../../ui/unsaved-changes/unsaved-changes';
import { DayInput } from '../../ui/day-input/day-input';
import { JobsApiClient } from '../jobs-api';
import { JobsPage } from '../state/jobs.actions';
import { selectSave } from '../state/jobs.selectors';
import { isHours, jobBody, jobFormGroup, plannable } from './job-form-group';

/** Takes on a job without an estimate: repeat work whose price and plan are known. */
@Component({
  selector: 'bm-job-form',
  imports: [
    CustomerChoice,
    DayInput,
    ErrorOf,
    FormErrors,
    MatButton,
    MatCheckbox,
    MatError,
    MatFormField,
    MatHint,
    MatInput,
    MatLabel,
    MatOption,
    MatPrefix,
    MatSelect,
    MatSuffix,
    MoneyInput,
    PageHead,
    Panel,
    ReactiveFormsModule,
    RouterLink,
  ],
  templateUrl: './job-form.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class JobForm implements HasUnsavedChanges {
  /** From the address: whose job it will be. */
  readonly customerId = input<string>();

  private readonly store = inject(Store);
  private readonly api = inject(JobsApiClient);
  private readonly builder = inject(NonNullableFormBuilder);
  protected readonly form = jobFormGroup(this.builder);
  protected readonly save = this.store.selectSignal(selectSave);
  protected readonly categories = COST_CATEGORIES.map((key) => ({ key, name: COST_CATEGORY_NAMES[key] }));

  private readonly customerChoice = viewChild.required(CustomerChoice);
  protected readonly sites = signal<readonly Site[]>([]);
  protected readonly operations = signal<readonly Operation[]>([]);

  constructor() {
    this.store.dispatch(JobsPage.formOpened());
    warnBeforeUnload(() => this.hasUnsavedChanges());
    effect(() => {
      const id = this.customerId();
      if (id) untracked(() => this.form.controls.customerId.setValue(id));
    });
    this.api
      .operations()
      .pipe(
        takeUntilDestroyed(),
        catchError(() => of<Operation[]>([])),
      )
      .subscribe((operations) => this.offer(plannable(operations)));
  }

  hasUnsavedChanges(): boolean {
    return this.form.dirty && this.save().status !== 'saved';
  }

  protected offerSites(customer: CustomerWithSites | null): void {
    this.sites.set(customer?.sites ?? []);
    this.form.patchValue({ siteId: customer?.sites[0]?.id ?? null });
  }

  protected hoursOf(operationId: string): AbstractControl {
    return this.form.controls.hours.controls[operationId]!;
  }

  protected submit(element: HTMLFormElement): void {
    this.form.updateValueAndValidity();
    this.form.markAllAsTouched();
    this.customerChoice().touch();
    const parsed = createJobSchema.safeParse(jobBody(this.form.getRawValue()));
    if (!parsed.success)
      placeFieldProblems(
        this.form,
        parsed.error.issues.map(({ path, message }) => ({ path: path.map(String).join('.'), message })),
      );
    if (!parsed.success || !this.form.valid) {
      focusFirstInvalid(element);
      return;
    }
    this.store.dispatch(JobsPage.createSubmitted({ fields: parsed.data }));
  }

  private offer(operations: readonly Operation[]): void {
    for (const { id } of operations)
      this.form.controls.hours.addControl(id, this.builder.control('', { validators: [hoursOnly] }));
    this.operations.set(operations);
  }
}

const hoursOnly = (control: AbstractControl<string>) =>
  isHours(control.value) ? null : { problem: 'Give hours, such as 7.5.' };
