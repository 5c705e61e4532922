import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  signal,
  untracked,
} from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatCheckbox } from '@angular/material/checkbox';
import { MatError, MatFormField, MatLabel } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { MatOption, MatSelect } from '@angular/material/select';
import { RouterLink } from '@angular/router';
import {
  createCustomerSchema,
  CUSTOMER_KINDS,
  type Customer,
} from '@bookmatch/common/customers/customers-contract';
import { Store } from '@ngrx/store';
import { changedFields } from '../../ui/form-errors/changed-fields';
import { checkForm } from '../../ui/form-errors/check-form';
import { ErrorOf } from '../../ui/form-errors/error-of';
import { focusFirstInvalid, FormErrors } from '../../ui/form-errors/form-errors';
import { PageHead } from '../../ui/page-head/page-head';
import { Panel } from '../../ui/panel/panel';
import { ProblemNote } from '../../ui/problem-note/problem-note';
import { warnBeforeUnload, type HasUnsavedChanges } from '../../ui/unsaved-changes/unsaved-changes';
import { AddressFields } from '../address-fields/address-fields';
import { CUSTOMER_KIND_NAMES } from '../customer-names';
import { CustomersPage } from '../state/customers.actions';
import { selectCustomer, selectOpenProblem, selectSave } from '../state/customers.selectors';
import { CUSTOMER_FIELD_LABELS, customerFormGroup } from './customer-form-group';

/** Adds a customer, or changes the one in the address. */
@Component({
  selector: 'bm-customer-form',
  imports: [
    AddressFields,
    ErrorOf,
    FormErrors,
    MatButton,
    MatCheckbox,
    MatError,
    MatFormField,
    MatInput,
    MatLabel,
    MatOption,
    MatSelect,
    PageHead,
    Panel,
    ProblemNote,
    ReactiveFormsModule,
    RouterLink,
  ],
  templateUrl: './customer-form.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CustomerForm implements HasUnsavedChanges {
  /** From the address; absent for a new customer. */
  readonly id = input<string>();

  private readonly store = inject(Store);
  protected readonly form = customerFormGroup(inject(NonNullableFormBuilder));
  protected readonly kinds = CUSTOMER_KINDS.map((value) => ({ value, name: CUSTOMER_KIND_NAMES[value] }));
  protected readonly taxExempt = toSignal(this.form.controls.taxExempt.valueChanges, { initialValue: false });

  private readonly selected = computed(() => this.store.selectSignal(selectCustomer(this.id() ?? '')));
  protected readonly customer = computed(() => this.selected()());
  protected readonly openProblem = this.store.selectSignal(selectOpenProblem);
  protected readonly save = this.store.selectSignal(selectSave);

  /** What the form was filled with; compared with what is stored when somebody else was quicker. */
  private readonly filledFrom = signal<Customer | null>(null);
  protected readonly changedMeanwhile = computed(() => {
    const [before, now] = [this.filledFrom(), this.customer()];
    if (!before || !now || before.version === now.version || this.save().status === 'saved') return null;
    return changedFields(before, now, CUSTOMER_FIELD_LABELS).join(', ');
  });
  /** The conflict is told with its fields then, and not a second time without them. */
  protected readonly isTold = computed(
    () => this.save().problem?.code === 'stale-version' && Boolean(this.changedMeanwhile()),
  );

  constructor() {
    this.store.dispatch(CustomersPage.formOpened());
    warnBeforeUnload(() => this.hasUnsavedChanges());
    effect(() => {
      const id = this.id();
      if (id) untracked(() => this.store.dispatch(CustomersPage.customerOpened({ id })));
    });
    effect(() => this.fillOnce(this.customer()));
  }

  hasUnsavedChanges(): boolean {
    return this.form.dirty && this.save().status !== 'saved';
  }

  protected submit(element: HTMLFormElement): void {
    const fields = checkForm(this.form, createCustomerSchema);
    if (!fields) {
      focusFirstInvalid(element);
      return;
    }
    const customer = this.customer();
    this.store.dispatch(
      customer
        ? CustomersPage.editSubmitted({ id: customer.id, version: customer.version, fields })
        : CustomersPage.createSubmitted({ fields }),
    );
  }

  /** Only while nothing is typed: a newer version never overwrites what the person is writing. */
  private fillOnce(customer: Customer | null): void {
    if (!customer || this.form.dirty) return;
    this.form.patchValue(customer);
    this.filledFrom.set(customer);
  }
}
