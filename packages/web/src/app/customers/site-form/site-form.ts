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
import { MatError, MatFormField, MatLabel } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { siteFieldsSchema, type Site } from '@bookmatch/common/customers/customers-contract';
import { Store } from '@ngrx/store';
import { checkForm } from '../../ui/form-errors/check-form';
import { ErrorOf } from '../../ui/form-errors/error-of';
import { focusFirstInvalid, FormErrors } from '../../ui/form-errors/form-errors';
import { AddressFields } from '../address-fields/address-fields';
import { addressForm } from '../address-fields/address-form';
import { CustomersPage } from '../state/customers.actions';
import { selectSiteSave } from '../state/customers.selectors';

/** Whose site, and which one; null adds a new one. */
export type SiteFormSubject = { customerId: string; site: Site | null };

@Component({
  selector: 'bm-site-form',
  imports: [
    AddressFields,
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
  templateUrl: './site-form.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SiteForm {
  private readonly store = inject(Store);
  private readonly builder = inject(NonNullableFormBuilder);
  protected readonly subject = inject<SiteFormSubject>(MAT_DIALOG_DATA);
  protected readonly dialog = inject<MatDialogRef<SiteForm>>(MatDialogRef);
  protected readonly save = this.store.selectSignal(selectSiteSave);
  protected readonly form = this.builder.group({
    name: this.subject.site?.name ?? '',
    address: addressForm(this.builder, this.subject.site?.address),
    notes: this.subject.site?.notes ?? '',
  });

  constructor() {
    this.store.dispatch(CustomersPage.siteFormOpened());
    effect(() => {
      if (this.save().status === 'saved') this.dialog.close();
    });
  }

  protected submit(element: HTMLFormElement): void {
    const fields = checkForm(this.form, siteFieldsSchema);
    if (!fields) {
      focusFirstInvalid(element);
      return;
    }
    const { customerId, site } = this.subject;
    this.store.dispatch(
      site ? CustomersPage.siteEdited({ site, fields }) : CustomersPage.siteAdded({ customerId, fields }),
    );
  }
}
