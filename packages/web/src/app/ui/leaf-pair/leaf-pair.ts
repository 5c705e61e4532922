import { booleanAttribute, ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { MINUS } from '@bookmatch/common/money/format';
import { leafBars, leafScale, leafTone, type LeafRow } from './leaf-row';

/**
 * The mirrored pair: what was planned to the left of the spine, what was built to the right, what ran over in red at
 * the end of its bar. A table to whoever cannot see it, and readable in black and white: hatch against solid.
 */
@Component({
  selector: 'bm-leaf-pair',
  templateUrl: './leaf-pair.html',
  styleUrl: './leaf-pair.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LeafPair {
  /** What is compared, for who cannot see the screen: "Cost by kind". */
  readonly label = input.required<string>();
  readonly rows = input.required<readonly LeafRow[]>();
  /** Writes a figure with its unit. */
  readonly format = input.required<(figure: number) => string>();
  readonly plannedName = input('Planned');
  readonly builtName = input('Built');
  /** Stands in place of the total's difference: "on pace for $8,995". */
  readonly totalNote = input<string>();
  /** Beyond the plan is good here, as with what was billed. */
  readonly moreIsGood = input(false, { transform: booleanAttribute });
  /** True when a row's built figure opens its working. */
  readonly opens = input(false, { transform: booleanAttribute });
  readonly opened = output<LeafRow>();

  private readonly scale = computed(() => leafScale(this.rows()));
  protected readonly lines = computed(() => this.rows().map((row) => this.lineOf(row)));
  protected readonly total = computed(() =>
    this.lineOf({
      key: 'total',
      name: 'Total',
      planned: sum(this.rows().map(({ planned }) => planned)),
      built: sum(this.rows().map(({ built }) => built)),
      note: this.totalNote(),
    }),
  );

  private lineOf(row: LeafRow) {
    const format = this.format();
    return {
      row,
      bars: leafBars(row, this.scale()),
      tone: this.toneOf(row),
      planned: format(row.planned),
      built: format(row.built),
      difference: row.note ?? differenceText(row.built - row.planned, format),
    };
  }

  /** What has not begun is neither under nor over. */
  private toneOf(row: LeafRow): string {
    const tone = leafTone(row);
    return this.moreIsGood() || row.built === 0 ? 'even' : tone;
  }
}

const sum = (figures: readonly number[]): number => figures.reduce((total, figure) => total + figure, 0);

function differenceText(difference: number, format: (figure: number) => string): string {
  if (difference === 0) return format(0);
  return (difference > 0 ? '+' : MINUS) + format(Math.abs(difference));
}
