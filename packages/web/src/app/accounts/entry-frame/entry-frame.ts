import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { Mark } from '../../ui/mark/mark';

/** The frame of the screens before anybody is signed in. */
@Component({
  selector: 'bm-entry-frame',
  imports: [Mark],
  template: `
    <header><bm-mark />Bookmatch</header>
    <main>
      <h1>{{ heading() }}</h1>
      <ng-content />
    </main>
    <footer><ng-content select="[bmEntryFoot]" /></footer>
  `,
  styleUrl: './entry-frame.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class EntryFrame {
  readonly heading = input.required<string>();
}
