import { ChangeDetectionStrategy, Component, computed, inject, input, output } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { COST_CATEGORY_NAMES } from '@bookmatch/common/estimates/cost-categories';
import type { Job, JobBillingRow, JobMoney as Money } from '@bookmatch/common/jobs/jobs-contract';
import { formatRate } from '@bookmatch/common/money/format';
import { injectCan } from '../../platform/session/ability';
import { MoneyPipe } from '../../ui/formats/money.pipe';
import { moneyText } from '../../ui/formats/money-text';
import { SHOP_CURRENCY } from '../../ui/formats/shop-settings';
import { Panel } from '../../ui/panel/panel';
import { StatusChip } from '../../ui/status-chip/status-chip';
import { Working, type WorkingLine } from '../../ui/working/working';
import { invoiceChip } from '../invoice-chip';

/** What was agreed, billed, paid and earned: the schedule beside its invoices, and the working of each figure. */
@Component({
  selector: 'bm-job-money',
  imports: [MatButton, MoneyPipe, Panel, RouterLink, StatusChip, Working],
  templateUrl: './job-money.html',
  styleUrl: './job-money.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class JobMoney {
  readonly job = input.required<Job>();
  readonly money = input.required<Money>();
  /** A stage's invoice is being drafted: a second press would do nothing. */
  readonly busy = input(false);
  readonly bill = output<JobBillingRow>();

  private readonly currency = inject(SHOP_CURRENCY);
  protected readonly can = injectCan();
  protected readonly whole = (cents: number): string => moneyText(cents, this.currency(), 'whole');
  protected readonly rows = computed(() =>
    this.money().billing.map((row) => ({ ...row, chip: invoiceChip(row), percent: shareText(row) })),
  );
  protected readonly open = computed(() => this.money().billedCents - this.money().paidCents);

  protected readonly standing = computed(() => {
    const { overBilledCents } = this.money();
    if (overBilledCents === 0) return 'Billed as earned';
    return overBilledCents > 0 ? 'Over-billed' : 'Under-billed';
  });
  protected readonly standingCents = computed(() => Math.abs(this.money().overBilledCents));
  /** Earned: the completion, then the share of the contract. */
  protected readonly earnedLines = computed((): WorkingLine[] => {
    const { actualCostCents, expectedCostCents, percentComplete, contractNetCents } = this.money();
    return [
      { name: 'Cost so far', figure: this.whole(actualCostCents) },
      { name: 'Expected cost', note: 'spent and still to go', figure: this.whole(expectedCostCents) },
      {
        name: 'Complete',
        note: 'cost so far of expected cost',
        figure: percentComplete === null ? 'not known' : formatRate(percentComplete, 1),
      },
      { name: 'Contract without tax', figure: this.whole(contractNetCents) },
    ];
  });
  protected readonly expectedLines = computed((): WorkingLine[] =>
    this.money().costs.map(({ category, plannedCents, actualCents }) => ({
      name: COST_CATEGORY_NAMES[category],
      note: actualCents > plannedCents ? 'over its plan' : 'its plan',
      figure: this.whole(Math.max(plannedCents, actualCents)),
    })),
  );
}

/** `40%` where the schedule said a percent; amounts and the remainder speak for themselves. */
function shareText({ share }: JobBillingRow): string {
  return 'percent' in share ? `${share.percent}%` : '';
}
