import { ChangeDetectionStrategy, Component, input } from '@angular/core';

export type Tone = 'neutral' | 'good' | 'built' | 'over' | 'planned';

/** A state in a word or two. The word carries the meaning; the tone only helps the eye. */
@Component({
  selector: 'bm-status-chip',
  template: '<ng-content />',
  styleUrl: './status-chip.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { '[class]': 'tone()' },
})
export class StatusChip {
  readonly tone = input<Tone>('neutral');
}
