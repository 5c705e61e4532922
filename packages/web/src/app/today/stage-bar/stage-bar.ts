import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';

export type StageCount = { key: string; name: string; count: number };

/** How many stand at each stage: one bar in parts, the further on the fuller, and the same in words. */
@Component({
  selector: 'bm-stage-bar',
  template: `
    <svg viewBox="0 0 100 8" preserveAspectRatio="none" aria-hidden="true">
      @for (part of parts(); track part.key) {
        <rect
          y="0"
          height="8"
          [attr.x]="part.from"
          [attr.width]="part.width"
          [attr.fill-opacity]="part.fullness"
        />
      }
    </svg>
    <p>{{ words() }}</p>
  `,
  styleUrl: './stage-bar.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class StageBar {
  readonly stages = input.required<readonly StageCount[]>();

  protected readonly parts = computed(() => stageParts(this.stages()));
  protected readonly words = computed(() =>
    this.stages()
      .filter(({ count }) => count > 0)
      .map(({ name, count }) => `${count} ${name.toLowerCase()}`)
      .join(' · '),
  );
}

const GAP = 0.6;
const FAINTEST = 0.3;

/** Where each stage that has any begins, how wide it is in percent, and how full its color. */
export function stageParts(stages: readonly StageCount[]) {
  const total = stages.reduce((sum, { count }) => sum + count, 0);
  let from = 0;
  return stages.flatMap(({ key, count }, index) => {
    if (count === 0) return [];
    const share = (100 * count) / total;
    const fullness = FAINTEST + ((1 - FAINTEST) * index) / Math.max(1, stages.length - 1);
    const part = { key, from, width: Math.max(share - GAP, GAP), fullness };
    from += share;
    return [part];
  });
}
