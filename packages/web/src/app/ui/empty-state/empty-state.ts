import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { MatIcon } from '@angular/material/icon';

/** Says what goes in an empty place; the first step stands inside as a button. */
@Component({
  selector: 'bm-empty-state',
  imports: [MatIcon],
  template: `
    @if (icon(); as name) {
      <mat-icon [svgIcon]="name" />
    }
    <p class="title">{{ title() }}</p>
    <p class="text">{{ text() }}</p>
    <ng-content />
  `,
  styleUrl: './empty-state.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class EmptyState {
  readonly title = input.required<string>();
  readonly text = input('');
  readonly icon = input<string>();
}
