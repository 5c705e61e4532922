import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';

export type Choice = { value: string; name: string };

/** A quiet choice for the head of a list; the empty value means all. */
@Component({
  selector: 'bm-choice-field',
  template: `
    <select #field [attr.aria-label]="label()" (change)="chosen.emit(field.value)">
      @for (choice of choices(); track choice.value) {
        <option [value]="choice.value" [selected]="choice.value === value()">{{ choice.name }}</option>
      }
    </select>
  `,
  styleUrl: './choice-field.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ChoiceField {
  readonly label = input.required<string>();
  readonly choices = input.required<readonly Choice[]>();
  readonly value = input('');
  readonly chosen = output<string>();
}
