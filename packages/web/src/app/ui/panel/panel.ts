import { booleanAttribute, ChangeDetectionStrategy, Component, input } from '@angular/core';

let panels = 0;

/** A white sheet on the gray page, with a heading and room for a small action beside it. */
@Component({
  selector: 'bm-panel',
  template: `
    @if (heading(); as text) {
      <header>
        <h2 [id]="headingId">{{ text }}</h2>
        <ng-content select="[bmPanelAction]" />
      </header>
    }
    <ng-content />
  `,
  styleUrl: './panel.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: {
    '[class.flush]': 'flush()',
    '[attr.role]': 'heading() ? "region" : null',
    '[attr.aria-labelledby]': 'heading() ? headingId : null',
  },
})
export class Panel {
  readonly heading = input('');
  /** Without padding, for a table that runs to the edges. */
  readonly flush = input(false, { transform: booleanAttribute });
  protected readonly headingId = `bm-panel-${panels++}`;
}
