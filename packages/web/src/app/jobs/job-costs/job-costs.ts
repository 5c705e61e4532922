import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  untracked,
} from '@angular/core';
import { MatButton, MatIconButton } from '@angular/material/button';
import { MatDialog } from '@angular/material/dialog';
import { MatIcon } from '@angular/material/icon';
import { COST_CATEGORY_NAMES } from '@bookmatch/common/estimates/cost-categories';
import type { JobCost } from '@bookmatch/common/jobs/job-costs-contract';
import { Store } from '@ngrx/store';
import { injectCan } from '../../platform/session/ability';
import { Confirm } from '../../ui/confirm/confirm';
import { DateTextPipe } from '../../ui/formats/date-text.pipe';
import { MoneyPipe } from '../../ui/formats/money.pipe';
import { Panel } from '../../ui/panel/panel';
import { ProblemNote } from '../../ui/problem-note/problem-note';
import { CostForm } from '../cost-form/cost-form';
import { JobsPage } from '../state/jobs.actions';
import { selectCosts } from '../state/jobs.selectors';

/** What was spent on the job besides clocked time. A wrong entry is reversed and stays to be read. */
@Component({
  selector: 'bm-job-costs',
  imports: [DateTextPipe, MatButton, MatIcon, MatIconButton, MoneyPipe, Panel, ProblemNote],
  templateUrl: './job-costs.html',
  styleUrl: './job-costs.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class JobCosts {
  readonly jobId = input.required<string>();

  private readonly store = inject(Store);
  private readonly dialog = inject(MatDialog);
  private readonly confirm = inject(Confirm);
  protected readonly can = injectCan();
  protected readonly costs = this.store.selectSignal(selectCosts);
  protected readonly categoryNames = COST_CATEGORY_NAMES;
  protected readonly total = computed(() =>
    this.costs().rows.reduce((sum, { amountCents }) => sum + amountCents, 0),
  );

  constructor() {
    effect(() => this.load());
  }

  protected load(): void {
    const jobId = this.jobId();
    untracked(() => this.store.dispatch(JobsPage.costsOpened({ jobId })));
  }

  protected add(): void {
    this.dialog.open(CostForm, { data: this.jobId(), width: '560px', disableClose: true });
  }

  protected reverse({ id, description }: JobCost): void {
    const question = {
      title: `Reverse ${description}?`,
      text: 'An entry of the opposite amount takes it back. Both stay to be read.',
      action: 'Reverse',
      tone: 'harm',
      reason: { label: 'Reason', required: true },
    } as const;
    this.confirm.ask(question).subscribe((answer) => {
      if (!answer) return;
      const reason = answer.reason.slice(0, 300);
      this.store.dispatch(JobsPage.costReversalConfirmed({ jobId: this.jobId(), costId: id, reason }));
    });
  }

  protected mayReverse({ reversesId, reversedById }: JobCost): boolean {
    return reversesId === null && reversedById === null && this.can('create', 'JobCost');
  }
}
