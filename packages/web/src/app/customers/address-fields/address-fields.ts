import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { ReactiveFormsModule } from '@angular/forms';
import { MatError, MatFormField, MatLabel } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { ErrorOf } from '../../ui/form-errors/error-of';
import type { AddressForm } from './address-form';

/** The fields of a postal address. */
@Component({
  selector: 'bm-address-fields',
  imports: [ErrorOf, MatError, MatFormField, MatInput, MatLabel, ReactiveFormsModule],
  template: `
    <div class="bm-fields three" [formGroup]="form()">
      <mat-form-field class="wide">
        <mat-label>Street</mat-label>
        <input matInput autocomplete="off" formControlName="street" />
        <mat-error [bmErrorOf]="form().controls.street" />
      </mat-form-field>
      <mat-form-field class="wide">
        <mat-label>Apartment, floor or unit</mat-label>
        <input matInput autocomplete="off" formControlName="street2" />
        <mat-error [bmErrorOf]="form().controls.street2" />
      </mat-form-field>
      <mat-form-field>
        <mat-label>City</mat-label>
        <input matInput autocomplete="off" formControlName="city" />
        <mat-error [bmErrorOf]="form().controls.city" />
      </mat-form-field>
      <mat-form-field>
        <mat-label>State</mat-label>
        <input matInput autocomplete="off" formControlName="region" />
        <mat-error [bmErrorOf]="form().controls.region" />
      </mat-form-field>
      <mat-form-field>
        <mat-label>ZIP code</mat-label>
        <input matInput autocomplete="off" formControlName="postalCode" />
        <mat-error [bmErrorOf]="form().controls.postalCode" />
      </mat-form-field>
    </div>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class AddressFields {
  readonly form = input.required<AddressForm>();
}
