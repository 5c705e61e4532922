import { ChangeDetectionStrategy, Component, computed, effect, inject } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatIcon } from '@angular/material/icon';
import { RouterLink } from '@angular/router';
import { formatHours } from '@bookmatch/common/calendar/format';
import { JOB_STAGE_NAMES } from '@bookmatch/common/jobs/job-stages';
import { JOB_STAGES, type JobRow } from '@bookmatch/common/jobs/jobs-contract';
import { Store } from '@ngrx/store';
import { injectListAddress } from '../../platform/lists/list-address';
import { injectCan } from '../../platform/session/ability';
import { ChoiceField } from '../../ui/choice-field/choice-field';
import { Cell } from '../../ui/data-table/cell';
import type { Column } from '../../ui/data-table/column';
import { DataTable } from '../../ui/data-table/data-table';
import { EmptyState } from '../../ui/empty-state/empty-state';
import { DateTextPipe } from '../../ui/formats/date-text.pipe';
import { MoneyPipe } from '../../ui/formats/money.pipe';
import { PageHead } from '../../ui/page-head/page-head';
import { SearchField } from '../../ui/search-field/search-field';
import { StatusChip } from '../../ui/status-chip/status-chip';
import { DayField } from '../day-field/day-field';
import { JobViews } from '../job-views/job-views';
import { JobsApiClient } from '../jobs-api';
import { JobsPage } from '../state/jobs.actions';
import { selectJobList } from '../state/jobs.selectors';

@Component({
  selector: 'bm-job-list',
  imports: [
    Cell,
    ChoiceField,
    DataTable,
    DateTextPipe,
    DayField,
    EmptyState,
    JobViews,
    MatButton,
    MatIcon,
    MoneyPipe,
    PageHead,
    RouterLink,
    SearchField,
    StatusChip,
  ],
  templateUrl: './job-list.html',
  styleUrl: './job-list.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class JobList {
  private readonly store = inject(Store);
  private readonly api = inject(JobsApiClient);
  protected readonly can = injectCan();
  protected readonly address = injectListAddress(
    'stage',
    'assigned',
    'customerId',
    'installFrom',
    'installTo',
  );
  protected readonly list = this.store.selectSignal(selectJobList);
  protected readonly csvUrl = computed(() => this.api.csvUrl(this.address.query()));

  protected readonly stageNames = JOB_STAGE_NAMES;
  protected readonly stages = [
    { value: '', name: 'Every stage' },
    { value: 'open', name: 'All open' },
    ...JOB_STAGES.map((value) => ({ value, name: JOB_STAGE_NAMES[value] })),
  ];
  protected readonly assignments = [
    { value: '', name: 'All jobs' },
    { value: 'me', name: 'My jobs' },
  ];
  private readonly floorColumns: readonly Column<JobRow>[] = [
    { key: 'title', header: 'Job', sort: 'title', width: '26%' },
    { key: 'number', header: 'No.', sort: 'number', align: 'end', phone: 'hidden' },
    { key: 'customerName', header: 'Customer', text: ({ customerName }) => customerName },
    { key: 'stage', header: 'Stage', phone: 'side' },
    { key: 'installOn', header: 'Install', sort: 'installOn' },
    {
      key: 'hours',
      header: 'Clocked of planned',
      align: 'end',
      phone: 'hidden',
      text: ({ clockedMinutes, plannedMinutes }) =>
        `${formatHours(clockedMinutes)} of ${formatHours(plannedMinutes)}`,
    },
  ];
  private readonly moneyColumns: readonly Column<JobRow>[] = [
    { key: 'actualCost', header: 'Cost so far', align: 'end', phone: 'hidden' },
    { key: 'contract', header: 'Contract', align: 'end', phone: 'hidden' },
  ];
  protected readonly columns = computed(() =>
    this.can('read', 'Job', 'money') ? [...this.floorColumns, ...this.moneyColumns] : this.floorColumns,
  );
  protected readonly linkOf = ({ id }: JobRow): string => `/jobs/${id}`;

  constructor() {
    effect(() => this.load());
  }

  protected load(): void {
    this.store.dispatch(JobsPage.listOpened({ query: this.address.query() }));
  }

  protected isOver({ actualCostCents = 0, plannedCostCents = 0 }: JobRow): boolean {
    return plannedCostCents > 0 && actualCostCents > plannedCostCents;
  }
}
