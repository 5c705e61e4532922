import { ChangeDetectionStrategy, Component, inject, output, signal } from '@angular/core';
import { rxResource, toObservable, toSignal } from '@angular/core/rxjs-interop';
import {
  MatAutocomplete,
  MatAutocompleteTrigger,
  type MatAutocompleteSelectedEvent,
} from '@angular/material/autocomplete';
import { MatOption } from '@angular/material/core';
import { MatFormField, MatHint, MatLabel } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import type { CustomerRow } from '@bookmatch/common/customers/customers-contract';
import { debounceTime } from 'rxjs';
import { CustomersApiClient } from '../../customers/customers-public';

const TYPING_PAUSE_MS = 250;

/** Finds a customer the shop has already, by name, company, e-mail or phone. */
@Component({
  selector: 'bm-customer-search',
  imports: [MatAutocomplete, MatAutocompleteTrigger, MatFormField, MatHint, MatInput, MatLabel, MatOption],
  template: `
    <mat-form-field>
      <mat-label>Customer</mat-label>
      <input
        #field
        matInput
        autocomplete="off"
        placeholder="Name, company or phone"
        [matAutocomplete]="choices"
        (input)="type(field.value)"
      />
      <mat-autocomplete #choices="matAutocomplete" [displayWith]="nameOf" (optionSelected)="choose($event)">
        @for (customer of found.hasValue() ? found.value().rows : []; track customer.id) {
          <mat-option [value]="customer">
            {{ customer.name }}
            <span class="bm-quiet">{{ customer.company || customer.city || customer.phone }}</span>
          </mat-option>
        }
      </mat-autocomplete>
      <mat-hint role="status">
        @if (found.error()) {
          Finding does not work right now. Try again in a moment.
        } @else if (text() && found.hasValue() && found.value().rows.length === 0) {
          Nobody found.
        }
      </mat-hint>
    </mat-form-field>
  `,
  styles: 'mat-form-field { width: 100%; }',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CustomerSearch {
  /** Null while what is typed is nobody yet. */
  readonly chosen = output<CustomerRow | null>();

  private readonly api = inject(CustomersApiClient);
  protected readonly text = signal('');
  private readonly asked = toSignal(toObservable(this.text).pipe(debounceTime(TYPING_PAUSE_MS)), {
    initialValue: '',
  });
  protected readonly found = rxResource({
    params: () => this.asked().trim() || undefined,
    stream: ({ params: q }) => this.api.list({ q, limit: '8' }),
  });

  protected readonly nameOf = (customer: CustomerRow | string | null): string =>
    typeof customer === 'string' ? customer : (customer?.name ?? '');

  protected type(text: string): void {
    this.text.set(text);
    this.chosen.emit(null);
  }

  protected choose({ option }: MatAutocompleteSelectedEvent): void {
    this.chosen.emit(option.value as CustomerRow);
  }
}
