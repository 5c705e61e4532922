import { ChangeDetectionStrategy, Component, computed, effect, inject } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatIcon } from '@angular/material/icon';
import { RouterLink } from '@angular/router';
import { isOpenLead, LEAD_STAGE_NAMES } from '@bookmatch/common/leads/lead-stages';
import { LEAD_SOURCE_NAMES } from '@bookmatch/common/leads/lead-words';
import type { LeadRow } from '@bookmatch/common/leads/leads-contract';
import { Store } from '@ngrx/store';
import { injectListAddress, type ListQuery } from '../../platform/lists/list-address';
import { injectCan } from '../../platform/session/ability';
import { Cell } from '../../ui/data-table/cell';
import type { Column } from '../../ui/data-table/column';
import { DataTable } from '../../ui/data-table/data-table';
import { EmptyState } from '../../ui/empty-state/empty-state';
import { DateTextPipe } from '../../ui/formats/date-text.pipe';
import { MoneyPipe } from '../../ui/formats/money.pipe';
import { PageHead } from '../../ui/page-head/page-head';
import { StatusChip } from '../../ui/status-chip/status-chip';
import { LeadFilters } from '../lead-views/lead-filters';
import { LeadViews } from '../lead-views/lead-views';
import { LeadsApiClient } from '../leads-api';
import { StepDate } from '../next-step/step-date';
import { STAGE_TONES } from '../stage-moves';
import { LeadsPage } from '../state/leads.actions';
import { selectLeadList } from '../state/leads.selectors';

const BY_NEXT_STEP = 'nextStepOn';

@Component({
  selector: 'bm-lead-list',
  imports: [
    Cell,
    DataTable,
    DateTextPipe,
    EmptyState,
    LeadFilters,
    LeadViews,
    MatButton,
    MatIcon,
    MoneyPipe,
    PageHead,
    RouterLink,
    StatusChip,
    StepDate,
  ],
  templateUrl: './lead-list.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LeadList {
  private readonly store = inject(Store);
  private readonly api = inject(LeadsApiClient);
  protected readonly can = injectCan();
  protected readonly address = injectListAddress('stage', 'nextStep', 'source');
  protected readonly list = this.store.selectSignal(selectLeadList);
  protected readonly query = computed(() => workingQuery(this.address.query()));
  protected readonly csvUrl = computed(() => this.api.csvUrl(this.query()));

  protected readonly stageNames = LEAD_STAGE_NAMES;
  protected readonly stageTones = STAGE_TONES;
  protected readonly columns: readonly Column<LeadRow>[] = [
    { key: 'title', header: 'Lead', sort: 'title', width: '30%' },
    { key: 'stage', header: 'Stage', phone: 'side' },
    { key: 'nextStep', header: 'Next step', text: ({ nextStep }) => nextStep, width: '20%', phone: 'hidden' },
    {
      key: 'nextStepOn',
      header: 'On',
      sort: BY_NEXT_STEP,
      text: ({ stage, nextStepOn }) => (isOpenLead(stage) ? (nextStepOn ?? '') : ''),
    },
    { key: 'source', header: 'Source', text: ({ source }) => LEAD_SOURCE_NAMES[source], phone: 'hidden' },
    {
      key: 'expected',
      header: 'Expected',
      align: 'end',
      text: ({ expectedCents }) => (expectedCents == null ? '' : String(expectedCents)),
    },
    { key: 'createdAt', header: 'Came in', sort: 'createdAt', align: 'end', phone: 'hidden' },
  ];
  protected readonly linkOf = ({ id }: LeadRow): string => `/leads/${id}`;

  constructor() {
    effect(() => this.load());
  }

  protected load(): void {
    this.store.dispatch(LeadsPage.listOpened({ query: this.query() }));
  }
}

/** What is worked on comes first: the open leads, the soonest next step on top, unless the address says otherwise. */
function workingQuery({ stage = 'open', sort = BY_NEXT_STEP, ...rest }: ListQuery): ListQuery {
  return stage === 'all' ? { ...rest, sort } : { ...rest, sort, stage };
}
