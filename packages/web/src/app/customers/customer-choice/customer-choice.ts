import { ChangeDetectionStrategy, Component, DestroyRef, effect, inject, input, output } from '@angular/core';
import { takeUntilDestroyed, toSignal } from '@angular/core/rxjs-interop';
import { FormControl, ReactiveFormsModule, type AbstractControl } from '@angular/forms';
import {
  MatAutocomplete,
  MatAutocompleteTrigger,
  type MatAutocompleteSelectedEvent,
} from '@angular/material/autocomplete';
import { MatError, MatFormField, MatLabel } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { MatOption } from '@angular/material/select';
import type { CustomerWithSites } from '@bookmatch/common/customers/customers-contract';
import { catchError, debounceTime, filter, map, of, switchMap } from 'rxjs';
import { ErrorOf } from '../../ui/form-errors/error-of';
import { CustomersApiClient } from '../customers-api';

type Shown = { id: string; name: string };

/**
 * Finds a customer by name, company, phone or e-mail and puts the id into a control. `chosen` brings the customer with
 * the sites, also for an id that stands in the control from the start.
 */
@Component({
  selector: 'bm-customer-choice',
  imports: [
    ErrorOf,
    MatAutocomplete,
    MatAutocompleteTrigger,
    MatError,
    MatFormField,
    MatInput,
    MatLabel,
    MatOption,
    ReactiveFormsModule,
  ],
  template: `
    <mat-form-field>
      <mat-label>Customer</mat-label>
      <input matInput autocomplete="off" required [formControl]="typed" [matAutocomplete]="customers" />
      <mat-autocomplete #customers [displayWith]="nameOf" (optionSelected)="pick($event)">
        @for (row of found(); track row.id) {
          <mat-option [value]="row">
            {{ row.name }} <span class="bm-quiet">{{ row.company || row.city }}</span>
          </mat-option>
        }
      </mat-autocomplete>
      <mat-error [bmErrorOf]="typed" />
    </mat-form-field>
  `,
  styles: 'mat-form-field { width: 100%; }',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CustomerChoice {
  /** Holds the id; empty while nobody is chosen. */
  readonly control = input.required<FormControl<string>>();
  readonly chosen = output<CustomerWithSites | null>();

  private readonly api = inject(CustomersApiClient);
  private readonly destroyed = inject(DestroyRef);
  /** A text while it is searched, the customer once chosen. */
  protected readonly typed = new FormControl<string | Shown>('', {
    nonNullable: true,
    validators: (control: AbstractControl<string | Shown>) =>
      typeof control.value === 'string' ? { problem: 'Choose a customer from the list.' } : null,
  });
  protected readonly found = toSignal(
    this.typed.valueChanges.pipe(
      filter((value) => typeof value === 'string'),
      debounceTime(250),
      switchMap((q) =>
        this.api.list({ q, limit: '10' }).pipe(
          map(({ rows }) => rows),
          catchError(() => of([])),
        ),
      ),
    ),
    { initialValue: [] },
  );
  protected readonly nameOf = (value: string | Shown): string =>
    typeof value === 'string' ? value : value.name;

  constructor() {
    effect(() => {
      const id = this.control().value;
      if (id) this.take(id);
    });
    this.typed.valueChanges.pipe(takeUntilDestroyed()).subscribe((value) => {
      if (typeof value === 'string' && this.control().value !== '') this.clear();
    });
  }

  /** The form was sent: shows at the field that nobody is chosen. */
  touch(): void {
    this.typed.markAsTouched();
    this.typed.updateValueAndValidity();
  }

  protected pick({ option }: MatAutocompleteSelectedEvent): void {
    this.take((option.value as Shown).id);
  }

  private take(id: string): void {
    this.api
      .read(id)
      .pipe(
        takeUntilDestroyed(this.destroyed),
        catchError(() => of(null)),
      )
      .subscribe((customer) => {
        if (!customer) return;
        this.typed.setValue({ id, name: customer.name });
        this.control().setValue(id);
        this.control().markAsDirty();
        this.chosen.emit(customer);
      });
  }

  private clear(): void {
    this.control().setValue('');
    this.chosen.emit(null);
  }
}
