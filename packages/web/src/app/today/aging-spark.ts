import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import type { AgingBuckets } from '@bookmatch/common/invoices/aging-contract';
import { agingBars } from '../invoices/invoices-public';
import { moneyText } from '../ui/formats/money-text';
import { SHOP_CURRENCY } from '../ui/formats/shop-settings';

const HEIGHT = 28;
const LEAST = 1.5;

/** What is owed by age as five small columns, the oldest at the right; the figures in words for who cannot see them. */
@Component({
  selector: 'bm-aging-spark',
  template: `
    <svg viewBox="0 0 100 28" preserveAspectRatio="none" role="img" [attr.aria-label]="words()">
      @for (column of columns(); track column.key) {
        <rect
          width="17"
          rx="1"
          [class.late]="column.late"
          [attr.x]="column.x"
          [attr.y]="column.y"
          [attr.height]="column.height"
        />
      }
    </svg>
  `,
  styles: `
    svg {
      display: block;
      width: 100%;
      height: 28px;
      border-bottom: 1px solid var(--mat-sys-outline);
    }

    rect {
      fill: var(--bm-planned-line);
    }

    .late {
      fill: var(--bm-over-bar);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class AgingSpark {
  readonly buckets = input.required<AgingBuckets>();
  private readonly currency = inject(SHOP_CURRENCY);
  private readonly bars = computed(() => agingBars(this.buckets()));

  protected readonly columns = computed(() => {
    const most = Math.max(1, ...this.bars().map(({ cents }) => cents));
    return this.bars().map(({ key, cents, late }, index) => {
      const height = cents <= 0 ? 0 : Math.max(LEAST, (HEIGHT * cents) / most);
      return { key, late, x: index * 20 + 1.5, y: HEIGHT - height, height };
    });
  });
  protected readonly words = computed(
    () =>
      'Owed: ' +
      this.bars()
        .map(({ name, cents }) => `${name.toLowerCase()} ${moneyText(cents, this.currency(), 'whole')}`)
        .join(', '),
  );
}
