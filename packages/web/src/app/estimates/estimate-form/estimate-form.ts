import {
  ChangeDetectionStrategy,
  Component,
  effect,
  inject,
  input,
  signal,
  untracked,
  viewChild,
} from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatError, MatFormField, MatLabel } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { MatOption, MatSelect } from '@angular/material/select';
import { RouterLink } from '@angular/router';
import type { CustomerWithSites } from '@bookmatch/common/customers/customers-contract';
import { createEstimateSchema } from '@bookmatch/common/estimates/estimates-contract';
import { Store } from '@ngrx/store';
import { CustomerChoice } from '../../customers/customers-public';
import { checkForm } from '../../ui/form-errors/check-form';
import { ErrorOf } from '../../ui/form-errors/error-of';
import { focusFirstInvalid, FormErrors } from '../../ui/form-errors/form-errors';
import { PageHead } from '../../ui/page-head/page-head';
import { Panel } from '../../ui/panel/panel';
import { warnBeforeUnload, type HasUnsavedChanges } from '../../ui/unsaved-changes/unsaved-changes';
import { EstimatesPage } from '../state/estimates.actions';
import { selectCreate } from '../state/estimates.selectors';

/** Starts an estimate: for whom, where and what. Everything else is written in the editor. */
@Component({
  selector: 'bm-estimate-form',
  imports: [
    CustomerChoice,
    ErrorOf,
    FormErrors,
    MatButton,
    MatError,
    MatFormField,
    MatInput,
    MatLabel,
    MatOption,
    MatSelect,
    PageHead,
    Panel,
    ReactiveFormsModule,
    RouterLink,
  ],
  templateUrl: './estimate-form.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class EstimateForm implements HasUnsavedChanges {
  /** From the address: whose estimate it will be, and the lead it comes from. */
  readonly customerId = input<string>();
  readonly leadId = input<string>();

  private readonly store = inject(Store);
  private readonly builder = inject(NonNullableFormBuilder);
  private readonly choice = viewChild.required(CustomerChoice);
  protected readonly form = this.builder.group({
    title: '',
    customerId: '',
    siteId: this.builder.control<string | null>(null),
    leadId: this.builder.control<string | null>(null),
  });
  protected readonly save = this.store.selectSignal(selectCreate);
  protected readonly sites = signal<CustomerWithSites['sites']>([]);

  constructor() {
    this.store.dispatch(EstimatesPage.formOpened());
    warnBeforeUnload(() => this.hasUnsavedChanges());
    effect(() => {
      const asked = { customerId: this.customerId() ?? '', leadId: this.leadId() ?? null };
      untracked(() => this.form.patchValue(asked));
    });
  }

  hasUnsavedChanges(): boolean {
    return this.form.dirty && this.save().status !== 'saved';
  }

  /** The only site of a customer is most likely meant. */
  protected offerSites(customer: CustomerWithSites | null): void {
    const sites = customer?.sites ?? [];
    this.sites.set(sites);
    this.form.patchValue({ siteId: sites.length === 1 ? (sites[0]?.id ?? null) : null });
  }

  protected submit(element: HTMLFormElement): void {
    this.choice().touch();
    const fields = checkForm(this.form, createEstimateSchema);
    if (fields) this.store.dispatch(EstimatesPage.createSubmitted({ fields }));
    else focusFirstInvalid(element);
  }
}
