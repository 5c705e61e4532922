import { AGING_BUCKETS } from '@bookmatch/common/invoices/aging';
import type { AgingBuckets } from '@bookmatch/common/invoices/aging-contract';

export type AgingBar = {
  key: string;
  name: string;
  cents: number;
  /** Of the whole width, 0 to 100. What is there is never too thin to be seen. */
  percent: number;
  late: boolean;
};

const LEAST_PERCENT = 1.5;

/** One bar a bucket, as wide as its share of what is owed. */
export function agingBars(buckets: AgingBuckets): AgingBar[] {
  return AGING_BUCKETS.map(({ bucket, name }) => {
    const cents = buckets[bucket];
    const share = buckets.totalCents > 0 ? (100 * cents) / buckets.totalCents : 0;
    return {
      key: bucket,
      name,
      cents,
      percent: cents === 0 ? 0 : Math.max(LEAST_PERCENT, share),
      late: bucket !== 'currentCents',
    };
  });
}
