import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  untracked,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatIcon } from '@angular/material/icon';
import { RouterLink } from '@angular/router';
import { formatHours } from '@bookmatch/common/calendar/format';
import { JOB_STAGE_NAMES } from '@bookmatch/common/jobs/job-stages';
import { Store } from '@ngrx/store';
import { addressLines } from '../../customers/customers-public';
import { DateTextPipe } from '../../ui/formats/date-text.pipe';
import { LeafPair } from '../../ui/leaf-pair/leaf-pair';
import { PageHead } from '../../ui/page-head/page-head';
import { Panel } from '../../ui/panel/panel';
import { ProblemNote } from '../../ui/problem-note/problem-note';
import { Skeleton } from '../../ui/skeleton/skeleton';
import { StatusChip } from '../../ui/status-chip/status-chip';
import { JobFiles } from '../job-files/job-files';
import { hourLeaves } from '../job-leaves';
import { JobsPage } from '../state/jobs.actions';
import { selectJob, selectOpenProblem } from '../state/jobs.selectors';

/** A job as the crew needs it: where, when, what is noted, the hours, the photos. There is no money in it. */
@Component({
  selector: 'bm-floor-job',
  imports: [
    DateTextPipe,
    JobFiles,
    LeafPair,
    MatButton,
    MatIcon,
    PageHead,
    Panel,
    ProblemNote,
    RouterLink,
    Skeleton,
    StatusChip,
  ],
  templateUrl: './floor-job.html',
  styleUrl: './floor-job.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FloorJob {
  /** From the address. */
  readonly id = input.required<string>();

  private readonly store = inject(Store);
  private readonly selected = computed(() => this.store.selectSignal(selectJob(this.id())));
  protected readonly job = computed(() => this.selected()());
  protected readonly problem = this.store.selectSignal(selectOpenProblem);
  protected readonly stageNames = JOB_STAGE_NAMES;
  protected readonly hours = formatHours;
  protected readonly address = computed(() => {
    const site = this.job()?.site;
    return site ? addressLines(site.address) : [];
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
}
