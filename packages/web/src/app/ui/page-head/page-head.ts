import { ChangeDetectionStrategy, Component, effect, inject, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import { MatIcon } from '@angular/material/icon';
import { PageTitle } from '../../platform/page/page-title';

/**
 * The head of a screen: its number in quiet ink, its name as the one heading, one line of facts, actions at the right.
 * Facts go in as `<span bmFacts>`, actions as children; the primary one comes last.
 */
@Component({
  selector: 'bm-page-head',
  imports: [RouterLink, MatIcon],
  template: `
    <div class="words">
      @if (backTo(); as link) {
        <a class="number" [routerLink]="link"
          ><mat-icon class="bm-small-icon" svgIcon="back" />{{ number() }}</a
        >
      } @else if (number()) {
        <p class="number">{{ number() }}</p>
      }
      <h1 tabindex="-1">{{ name() }}</h1>
      <div class="facts"><ng-content select="[bmFacts]" /></div>
    </div>
    <div class="actions"><ng-content /></div>
  `,
  styleUrl: './page-head.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PageHead {
  readonly name = input.required<string>();
  /** `Job 1042`, or the name of the list it belongs to. */
  readonly number = input('');
  /** Where the list is; turns the number into the way back. */
  readonly backTo = input<string>();
  private readonly title = inject(PageTitle);

  constructor() {
    effect(() => this.title.show(this.name()));
  }
}
