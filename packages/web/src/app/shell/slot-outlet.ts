import { NgComponentOutlet } from '@angular/common';
import { ChangeDetectionStrategy, Component, input, resource } from '@angular/core';
import type { Slot } from './slots';

/** Shows what fills a slot, once it is loaded. */
@Component({
  selector: 'bm-slot-outlet',
  imports: [NgComponentOutlet],
  template: `
    @if (filling.hasValue() && filling.value(); as component) {
      <ng-container *ngComponentOutlet="component" />
    }
  `,
  styles: ':host { display: contents; }',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SlotOutlet {
  readonly slot = input.required<Slot | null>();
  protected readonly filling = resource({
    params: () => this.slot() ?? undefined,
    loader: ({ params: load }) => load(),
  });
}
