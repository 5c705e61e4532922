import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { AgingBuckets } from '@bookmatch/common/invoices/aging-contract';
import { MoneyPipe } from '../../ui/formats/money.pipe';
import { agingBars } from './aging-bars';

/** What is owed by how late it is: bars for the eye, a list with the figures for everybody. */
@Component({
  selector: 'bm-aging-strip',
  imports: [MoneyPipe],
  templateUrl: './aging-strip.html',
  styleUrl: './aging-strip.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class AgingStrip {
  readonly buckets = input.required<AgingBuckets>();
  protected readonly bars = computed(() => agingBars(this.buckets()));
  /** Where each bar begins, in percent of the width. */
  protected readonly starts = computed(() => {
    let at = 0;
    return this.bars().map(({ percent }) => (at += percent) - percent);
  });
}
