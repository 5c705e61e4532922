import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { MatButton } from '@angular/material/button';
import {
  MAT_DIALOG_DATA,
  MatDialogActions,
  MatDialogClose,
  MatDialogContent,
  MatDialogTitle,
} from '@angular/material/dialog';
import { formatHours } from '@bookmatch/common/calendar/format';
import { COST_CATEGORY_NAMES, type CostCategory } from '@bookmatch/common/estimates/cost-categories';
import type { Job } from '@bookmatch/common/jobs/jobs-contract';
import { Store } from '@ngrx/store';
import { MoneyPipe } from '../../ui/formats/money.pipe';
import { selectCosts } from '../state/jobs.selectors';

export type CostWorkingSubject = { job: Job; category: CostCategory };

/** What a category's cost is made of: each entry, and the time clocked to the operations that fall in it. */
@Component({
  selector: 'bm-cost-working',
  imports: [MatButton, MatDialogActions, MatDialogClose, MatDialogContent, MatDialogTitle, MoneyPipe],
  templateUrl: './cost-working.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CostWorking {
  private readonly subject = inject<CostWorkingSubject>(MAT_DIALOG_DATA);
  private readonly costs = inject(Store).selectSignal(selectCosts);
  protected readonly name = COST_CATEGORY_NAMES[this.subject.category];
  protected readonly total =
    this.subject.job.money?.costs.find(({ category }) => category === this.subject.category)?.actualCents ??
    0;

  private readonly entries = computed(() =>
    this.costs()
      .rows.filter(({ category }) => category === this.subject.category)
      .map(({ id, description, onDate, amountCents }) => ({
        key: id,
        name: description,
        note: onDate,
        cents: amountCents,
      })),
  );
  private readonly labor = this.subject.job.operations
    .filter(
      ({ category, actualCostCents }) => category === this.subject.category && (actualCostCents ?? 0) !== 0,
    )
    .map(({ operationId, name, clockedMinutes, actualCostCents }) => ({
      key: operationId,
      name,
      note: `${formatHours(clockedMinutes)} clocked`,
      cents: actualCostCents ?? 0,
    }));
  protected readonly lines = computed(() => [...this.labor, ...this.entries()]);
}
