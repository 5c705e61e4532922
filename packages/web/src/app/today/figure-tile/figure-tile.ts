import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { RouterLink } from '@angular/router';

/** One figure of the shop at a glance, with a small picture under it. The whole tile leads to its list. */
@Component({
  selector: 'bm-figure-tile',
  imports: [RouterLink],
  template: `
    <a [routerLink]="link()" [queryParams]="params()">
      <span class="name">{{ name() }}</span>
      <span class="figure" [class.over]="over()">{{ figure() }}</span>
      @if (note()) {
        <span class="note">{{ note() }}</span>
      }
    </a>
    <ng-content />
  `,
  styleUrl: './figure-tile.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FigureTile {
  readonly name = input.required<string>();
  readonly figure = input.required<string | number>();
  readonly note = input('');
  /** What should not be there, and is. */
  readonly over = input(false);
  readonly link = input.required<string>();
  readonly params = input<Record<string, string>>({});
}
