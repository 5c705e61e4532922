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
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatError, MatFormField, MatLabel, MatPrefix } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { MatOption, MatSelect } from '@angular/material/select';
import { RouterLink } from '@angular/router';
import { LEAD_SOURCE_NAMES } from '@bookmatch/common/leads/lead-words';
import { createLeadSchema, LEAD_SOURCES, type Lead } from '@bookmatch/common/leads/leads-contract';
import { Store } from '@ngrx/store';
import { AddressFields, CustomersApiClient } from '../../customers/customers-public';
import { DayInput } from '../../ui/day-input/day-input';
import { changedFields } from '../../ui/form-errors/changed-fields';
import { checkForm } from '../../ui/form-errors/check-form';
import { ErrorOf } from '../../ui/form-errors/error-of';
import { focusFirstInvalid, FormErrors } from '../../ui/form-errors/form-errors';
import { MoneyInput } from '../../ui/money-input/money-input';
import { PageHead } from '../../ui/page-head/page-head';
import { Panel } from '../../ui/panel/panel';
import { ProblemNote } from '../../ui/problem-note/problem-note';
import { warnBeforeUnload, type HasUnsavedChanges } from '../../ui/unsaved-changes/unsaved-changes';
import { LeadsPage } from '../state/leads.actions';
import { selectLead, selectOpenProblem, selectSave } from '../state/leads.selectors';
import { LEAD_FIELD_LABELS, leadFormGroup } from './lead-form-group';

/** Takes in a lead, or changes the one in the address. */
@Component({
  selector: 'bm-lead-form',
  imports: [
    AddressFields,
    DayInput,
    ErrorOf,
    FormErrors,
    MatButton,
    MatError,
    MatFormField,
    MatInput,
    MatLabel,
    MatOption,
    MatPrefix,
    MatSelect,
    MoneyInput,
    PageHead,
    Panel,
    ProblemNote,
    ReactiveFormsModule,
    RouterLink,
  ],
  templateUrl: './lead-form.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LeadForm implements HasUnsavedChanges {
  /** From the address; absent for a new lead. */
  readonly id = input<string>();
  /** From the address's query: a new lead of a customer the shop has already. */
  readonly customerId = input<string>();

  private readonly store = inject(Store);
  private readonly customers = inject(CustomersApiClient);
  protected readonly form = leadFormGroup(inject(NonNullableFormBuilder));
  protected readonly sources = LEAD_SOURCES.map((value) => ({ value, name: LEAD_SOURCE_NAMES[value] }));

  private readonly selected = computed(() => this.store.selectSignal(selectLead(this.id() ?? '')));
  protected readonly lead = computed(() => this.selected()());
  protected readonly openProblem = this.store.selectSignal(selectOpenProblem);
  protected readonly save = this.store.selectSignal(selectSave('lead'));
  protected readonly customerName = signal<string | null>(null);

  /** What the form was filled with; compared with what is stored when somebody else was quicker. */
  private readonly filledFrom = signal<Lead | null>(null);
  protected readonly changedMeanwhile = computed(() => {
    const [before, now] = [this.filledFrom(), this.lead()];
    if (!before || !now || before.version === now.version || this.save().status === 'saved') return null;
    return changedFields(before, now, LEAD_FIELD_LABELS).join(', ');
  });
  /** The conflict is told with its fields then, and not a second time without them. */
  protected readonly isTold = computed(
    () => this.save().problem?.code === 'stale-version' && Boolean(this.changedMeanwhile()),
  );

  constructor() {
    this.store.dispatch(LeadsPage.formOpened({ form: 'lead' }));
    warnBeforeUnload(() => this.hasUnsavedChanges());
    effect(() => {
      const id = this.id();
      if (id) untracked(() => this.store.dispatch(LeadsPage.leadOpened({ id })));
    });
    effect(() => this.fillOnce(this.lead()));
    effect(() => {
      const customerId = this.customerId();
      if (customerId && !this.id()) untracked(() => this.takeOver(customerId));
    });
  }

  hasUnsavedChanges(): boolean {
    return this.form.dirty && this.save().status !== 'saved';
  }

  protected submit(element: HTMLFormElement): void {
    const fields = checkForm(this.form, createLeadSchema);
    if (!fields) {
      focusFirstInvalid(element);
      return;
    }
    const lead = this.lead();
    this.store.dispatch(
      lead ? LeadsPage.editSubmitted({ lead, fields }) : LeadsPage.createSubmitted({ fields }),
    );
  }

  /** Only while nothing is typed: a newer version never overwrites what the person is writing. */
  private fillOnce(lead: Lead | null): void {
    if (!lead || this.form.dirty) return;
    this.form.patchValue(lead);
    this.filledFrom.set(lead);
    this.customerName.set(lead.customerName);
  }

  /** A new lead of a known customer starts with who they are. If they cannot be read, the form starts empty. */
  private takeOver(customerId: string): void {
    this.customers.read(customerId).subscribe({
      next: ({ id, name, company, email, phone }) => {
        this.customerName.set(name);
        this.form.patchValue({ customerId: id, source: 'repeat-customer' });
        if (!this.form.dirty) this.form.patchValue({ contactName: name, company, email, phone });
      },
      error: () => this.customerName.set(null),
    });
  }
}
