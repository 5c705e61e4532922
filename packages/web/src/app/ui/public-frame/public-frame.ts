import { ChangeDetectionStrategy, Component, effect, inject, input } from '@angular/core';
import { Title } from '@angular/platform-browser';

/** The frame of what a customer sees behind a link: it carries the shop's name and nothing of ours. */
@Component({
  selector: 'bm-public-frame',
  template: `
    <header>
      <p class="shop">{{ shopName() }}</p>
      <ng-content select="[bmPublicActions]" />
    </header>
    <main><ng-content /></main>
    <footer>
      <p>{{ shopName() }}</p>
      @for (line of contact(); track $index) {
        <p>{{ line }}</p>
      }
    </footer>
  `,
  styleUrl: './public-frame.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PublicFrame {
  readonly shopName = input.required<string>();
  /** What the page is, for the window's title: "Estimate 318". */
  readonly about = input.required<string>();
  /** How to reach the shop, line by line. */
  readonly contact = input<readonly string[]>([]);

  constructor() {
    const title = inject(Title);
    effect(() => title.setTitle([this.about(), this.shopName()].filter(Boolean).join(' · ')));
  }
}
