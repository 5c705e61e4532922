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
import { MatMenu, MatMenuItem, MatMenuTrigger } from '@angular/material/menu';
import { Router, RouterLink } from '@angular/router';
import { formatHours } from '@bookmatch/common/calendar/format';
import { JOB_STAGE_NAMES, JOB_TRANSITIONS } from '@bookmatch/common/jobs/job-stages';
import {
  JOB_STAGES,
  type Job,
  type JobBillingRow,
  type JobStage,
} from '@bookmatch/common/jobs/jobs-contract';
import { Store } from '@ngrx/store';
import { injectCan } from '../../platform/session/ability';
import { DateTextPipe } from '../../ui/formats/date-text.pipe';
import { moneyText } from '../../ui/formats/money-text';
import { SHOP_CURRENCY } from '../../ui/formats/shop-settings';
import { LeafPair } from '../../ui/leaf-pair/leaf-pair';
import type { LeafRow } from '../../ui/leaf-pair/leaf-row';
import { PageHead } from '../../ui/page-head/page-head';
import { Panel } from '../../ui/panel/panel';
import { ProblemNote } from '../../ui/problem-note/problem-note';
import { Skeleton } from '../../ui/skeleton/skeleton';
import { StageTrack } from '../../ui/stage-track/stage-track';
import { ClockedThisWeek } from '../clocked-this-week/clocked-this-week';
import { CostWorking, type CostWorkingSubject } from '../cost-working/cost-working';
import { DetailsForm } from '../details-form/details-form';
import { JobCosts } from '../job-costs/job-costs';
import { JobCrew } from '../job-crew/job-crew';
import { JobFiles } from '../job-files/job-files';
import { actualName, billingLeaves, costLeaves, hourLeaves, paceNote } from '../job-leaves';
import { JobMoney } from '../job-money/job-money';
import { JobPlace } from '../job-place/job-place';
import { nextStep, type NextStep } from '../next-step';
import { StageMoves } from '../stage-moves';
import { JobsPage } from '../state/jobs.actions';
import { selectBilling, selectJob, selectOpenProblem } from '../state/jobs.selectors';

/** A job's page for the office and the lead hand: planned beside built, in hours, cost and billing. */
@Component({
  selector: 'bm-job-detail',
  imports: [
    ClockedThisWeek,
    JobCosts,
    JobCrew,
    JobFiles,
    JobMoney,
    JobPlace,
    LeafPair,
    MatButton,
    MatIcon,
    MatIconButton,
    MatMenu,
    MatMenuItem,
    MatMenuTrigger,
    PageHead,
    Panel,
    ProblemNote,
    RouterLink,
    Skeleton,
    StageTrack,
  ],
  templateUrl: './job-detail.html',
  styleUrl: './job-detail.scss',
  providers: [DateTextPipe],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class JobDetail {
  /** From the address. */
  readonly id = input.required<string>();

  private readonly store = inject(Store);
  private readonly router = inject(Router);
  private readonly dialog = inject(MatDialog);
  private readonly moves = inject(StageMoves);
  private readonly currency = inject(SHOP_CURRENCY);
  protected readonly can = injectCan();
  protected readonly stages = JOB_STAGES.map((key) => ({ key, name: JOB_STAGE_NAMES[key] }));
  protected readonly hours = formatHours;
  protected readonly whole = (cents: number): string => moneyText(cents, this.currency(), 'whole');

  private readonly selected = computed(() => this.store.selectSignal(selectJob(this.id())));
  protected readonly job = computed(() => this.selected()());
  protected readonly problem = this.store.selectSignal(selectOpenProblem);
  protected readonly billing = this.store.selectSignal(selectBilling);

  private readonly dateText = inject(DateTextPipe);
  protected readonly facts = computed(() => this.factsOf(this.job()));

  protected readonly movable = computed(() => this.can('update', 'Job'));
  protected readonly reachable = computed(() => {
    const job = this.job();
    return job && this.movable() ? JOB_TRANSITIONS[job.stage] : [];
  });
  protected readonly step = computed(() => {
    const job = this.job();
    const bill = this.can('create', 'Invoice');
    return job ? nextStep(job, { bill, move: this.movable() }) : null;
  });
  protected readonly costPair = computed(() => {
    const job = this.job();
    if (!job?.money) return null;
    const closed = job.closedAt !== null;
    return {
      rows: costLeaves(job.money, closed),
      actual: actualName(job.money, closed),
      pace: paceNote(job.money, closed, this.whole),
    };
  });
  protected readonly billingRows = computed(() => {
    const money = this.job()?.money;
    const rows = money ? billingLeaves(money) : [];
    return rows.length > 0 ? rows : null;
  });
  protected readonly hourRows = computed(() => {
    const job = this.job();
    return job ? hourLeaves(job) : [];
  });

  constructor() {
    effect(() => this.load());
  }

  protected load(): void {
    const id = this.id();
    untracked(() => this.store.dispatch(JobsPage.jobOpened({ id })));
  }

  protected take(job: Job, step: NextStep): void {
    if (step.kind === 'move') this.moves.ask(job, step.stage);
    else if (step.kind === 'open-invoice') void this.router.navigate(['/invoices', step.invoiceId]);
    else this.bill(job, step);
  }

  protected bill({ id }: Job, { billingStageId }: Pick<JobBillingRow, 'billingStageId'>): void {
    this.store.dispatch(JobsPage.billStagePressed({ jobId: id, billingStageId }));
  }

  protected move(job: Job, stage: string): void {
    this.moves.ask(job, stage as JobStage);
  }

  protected change(job: Job): void {
    this.dialog.open(DetailsForm, { data: job, width: '640px', disableClose: true });
  }

  protected openWorking(job: Job, row: LeafRow): void {
    const data: CostWorkingSubject = { job, category: row.key as CostWorkingSubject['category'] };
    this.dialog.open(CostWorking, { data, width: '560px' });
  }

  /** One line under the name; what follows it is the estimate, one step back. */
  private factsOf(job: Job | null): string {
    if (!job) return '';
    const install = job.installOn ? `install ${this.dateText.transform(job.installOn)}` : 'no install date';
    const facts = [job.customer.name, job.site?.name, install].filter(Boolean).join(' · ');
    return job.estimate ? `${facts} ·` : facts;
  }

  protected print(): void {
    globalThis.print();
  }
}
