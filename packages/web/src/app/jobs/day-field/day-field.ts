import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';

/** A quiet day for the head of a list; empty means any. */
@Component({
  selector: 'bm-day-field',
  template: `
    <label
      >{{ label() }}
      <input #field type="date" [value]="value()" (change)="chosen.emit(field.value)" />
    </label>
  `,
  styleUrl: './day-field.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class DayField {
  readonly label = input.required<string>();
  readonly value = input('');
  readonly chosen = output<string>();
}
