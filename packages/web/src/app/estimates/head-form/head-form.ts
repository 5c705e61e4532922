import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import {
  MAT_DIALOG_DATA,
  MatDialogActions,
  MatDialogClose,
  MatDialogContent,
  MatDialogRef,
  MatDialogTitle,
} from '@angular/material/dialog';
import { MatError, MatFormField, MatLabel } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { MatOption, MatSelect } from '@angular/material/select';
import { updateEstimateSchema, type Estimate } from '@bookmatch/common/estimates/estimates-contract';
import { Store } from '@ngrx/store';
import { catchError, map, of } from 'rxjs';
import { CustomersApiClient } from '../../customers/customers-public';
import { checkForm } from '../../ui/form-errors/check-form';
import { ErrorOf } from '../../ui/form-errors/error-of';
import { focusFirstInvalid } from '../../ui/form-errors/form-errors';
import { EstimatesPage } from '../state/estimates.actions';

/** The estimate's own fields: its title and where the work goes. */
@Component({
  selector: 'bm-head-form',
  imports: [
    ErrorOf,
    MatButton,
    MatDialogActions,
    MatDialogClose,
    MatDialogContent,
    MatDialogTitle,
    MatError,
    MatFormField,
    MatInput,
    MatLabel,
    MatOption,
    MatSelect,
    ReactiveFormsModule,
  ],
  template: `
    <h2 mat-dialog-title>Title and site</h2>
    <form #element novalidate [formGroup]="form" (ngSubmit)="submit(element)">
      <mat-dialog-content>
        <div class="bm-entry">
          <mat-form-field>
            <mat-label>Title</mat-label>
            <input matInput autocomplete="off" formControlName="title" />
            <mat-error [bmErrorOf]="form.controls.title" />
          </mat-form-field>
          <mat-form-field>
            <mat-label>Site</mat-label>
            <mat-select formControlName="siteId">
              <mat-option [value]="null">None</mat-option>
              @for (site of sites(); track site.id) {
                <mat-option [value]="site.id">{{ site.name }}</mat-option>
              }
            </mat-select>
          </mat-form-field>
        </div>
      </mat-dialog-content>
      <mat-dialog-actions>
        <button matButton type="button" mat-dialog-close>Cancel</button>
        <button matButton="filled" type="submit">Save</button>
      </mat-dialog-actions>
    </form>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class HeadForm {
  private readonly estimate = inject<Estimate>(MAT_DIALOG_DATA);
  private readonly dialog = inject<MatDialogRef<HeadForm>>(MatDialogRef);
  private readonly store = inject(Store);
  private readonly builder = inject(NonNullableFormBuilder);
  protected readonly form = this.builder.group({
    title: this.estimate.title,
    siteId: this.builder.control<string | null>(this.estimate.site?.id ?? null),
  });
  protected readonly sites = toSignal(
    inject(CustomersApiClient)
      .read(this.estimate.customer.id)
      .pipe(
        map(({ sites }) => sites),
        catchError(() => of([])),
      ),
    { initialValue: [] },
  );

  protected submit(element: HTMLFormElement): void {
    const fields = checkForm(this.form, updateEstimateSchema);
    if (!fields) {
      focusFirstInvalid(element);
      return;
    }
    this.store.dispatch(EstimatesPage.headEdited({ estimate: this.estimate, fields }));
    this.dialog.close();
  }
}
