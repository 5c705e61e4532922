import { ChangeDetectionStrategy, Component, effect, inject } from '@angular/core';
import { RouterLink } from '@angular/router';
import { dateIn } from '@bookmatch/common/calendar/shop-dates';
import type { TimeEntryRow } from '@bookmatch/common/time/time-contract';
import { Store } from '@ngrx/store';
import { injectListAddress } from '../../../platform/lists/list-address';
import { injectCan } from '../../../platform/session/ability';
import { Cell } from '../../../ui/data-table/cell';
import type { Column } from '../../../ui/data-table/column';
import { DataTable } from '../../../ui/data-table/data-table';
import { EmptyState } from '../../../ui/empty-state/empty-state';
import { DateTextPipe } from '../../../ui/formats/date-text.pipe';
import { DurationPipe } from '../../../ui/formats/duration.pipe';
import { MoneyPipe } from '../../../ui/formats/money.pipe';
import { SHOP_ZONE } from '../../../ui/formats/shop-settings';
import { PageHead } from '../../../ui/page-head/page-head';
import { SearchField } from '../../../ui/search-field/search-field';
import { StatusChip } from '../../../ui/status-chip/status-chip';
import { jobOf, whatOf } from '../../punches/work-words';
import { WeeksPage } from '../../state/weeks.actions';
import { weeksFeature } from '../../state/weeks.state';

/** Every time entry that one may see, newest first; a job's figures lead here. */
@Component({
  selector: 'bm-entry-list',
  imports: [
    Cell,
    DataTable,
    DateTextPipe,
    DurationPipe,
    EmptyState,
    MoneyPipe,
    PageHead,
    RouterLink,
    SearchField,
    StatusChip,
  ],
  templateUrl: './entry-list.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class EntryList {
  private readonly store = inject(Store);
  private readonly can = injectCan();
  protected readonly address = injectListAddress('jobId', 'operationId', 'memberId', 'from', 'to');
  protected readonly list = this.store.selectSignal(weeksFeature.selectEntryList);
  protected readonly whatOf = whatOf;
  protected readonly jobOf = jobOf;
  private readonly zone = inject(SHOP_ZONE);
  protected readonly dayOf = ({ startedAt }: TimeEntryRow): string => dateIn(this.zone(), startedAt);

  protected readonly columns: readonly Column<TimeEntryRow>[] = [
    { key: 'startedAt', header: 'When', sort: 'startedAt', width: '22%' },
    { key: 'member', header: 'Member' },
    { key: 'work', header: 'Work', width: '32%' },
    { key: 'minutes', header: 'Time', align: 'end', phone: 'side' },
    ...(this.can('read', 'TimeEntry', 'money')
      ? [{ key: 'cost', header: 'Cost', align: 'end', phone: 'hidden' } as const]
      : []),
    { key: 'state', header: 'State', phone: 'line' },
  ];

  constructor() {
    effect(() => this.load());
  }

  protected load(): void {
    this.store.dispatch(WeeksPage.listOpened({ query: this.address.query() }));
  }
}
