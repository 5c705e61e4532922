import { ChangeDetectionStrategy, Component, computed, effect, inject, viewChild } from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
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
import { MatRadioButton, MatRadioGroup } from '@angular/material/radio';
import { MatOption, MatSelect } from '@angular/material/select';
import { CUSTOMER_KINDS } from '@bookmatch/common/customers/customers-contract';
import type { Lead } from '@bookmatch/common/leads/leads-contract';
import { Store } from '@ngrx/store';
import { AddressFields, CUSTOMER_KIND_NAMES, CustomerChoice } from '../../customers/customers-public';
import { checkForm } from '../../ui/form-errors/check-form';
import { ErrorOf } from '../../ui/form-errors/error-of';
import { focusFirstInvalid, FormErrors } from '../../ui/form-errors/form-errors';
import { LeadsPage } from '../state/leads.actions';
import { selectLead, selectSave } from '../state/leads.selectors';
import { conversionForm, conversionSchema } from './conversion-form';

/** Makes a customer of a lead, or ties it to one the shop has, with the site the work would go to. */
@Component({
  selector: 'bm-lead-conversion',
  imports: [
    AddressFields,
    CustomerChoice,
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
    MatOption,
    MatRadioButton,
    MatRadioGroup,
    MatSelect,
    ReactiveFormsModule,
  ],
  templateUrl: './lead-conversion.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LeadConversion {
  private readonly store = inject(Store);
  private readonly opened = inject<Lead>(MAT_DIALOG_DATA);
  protected readonly dialog = inject<MatDialogRef<LeadConversion>>(MatDialogRef);
  private readonly newest = this.store.selectSignal(selectLead(this.opened.id));
  private readonly lead = computed(() => this.newest() ?? this.opened);
  protected readonly save = this.store.selectSignal(selectSave('conversion'));
  protected readonly kinds = CUSTOMER_KINDS.map((value) => ({ value, name: CUSTOMER_KIND_NAMES[value] }));
  protected readonly form = conversionForm(inject(NonNullableFormBuilder), this.opened);
  private readonly typed = toSignal(this.form.valueChanges, { initialValue: this.form.value });
  protected readonly who = computed(() => this.typed().who);
  protected readonly withSite = computed(() => this.typed().withSite);

  private readonly customerChoice = viewChild(CustomerChoice);

  constructor() {
    this.store.dispatch(LeadsPage.formOpened({ form: 'conversion' }));
    effect(() => {
      if (this.save().status === 'saved') this.dialog.close();
    });
  }

  protected submit(element: HTMLFormElement): void {
    this.customerChoice()?.touch();
    const conversion = checkForm(this.form, conversionSchema);
    if (conversion) this.store.dispatch(LeadsPage.conversionSubmitted({ lead: this.lead(), conversion }));
    else focusFirstInvalid(element);
  }
}
