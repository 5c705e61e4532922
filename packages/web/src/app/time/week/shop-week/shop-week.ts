import { ChangeDetectionStrategy, Component, computed, effect, inject, untracked } from '@angular/core';
import { MatAnchor } from '@angular/material/button';
import { MatIcon } from '@angular/material/icon';
import { RouterLink } from '@angular/router';
import { ROLE_NAMES } from '@bookmatch/common/access/roles';
import { sumCents } from '@bookmatch/common/money/cents';
import { Store } from '@ngrx/store';
import { injectCan } from '../../../platform/session/ability';
import { DateTextPipe } from '../../../ui/formats/date-text.pipe';
import { DurationPipe } from '../../../ui/formats/duration.pipe';
import { MoneyPipe } from '../../../ui/formats/money.pipe';
import { PageHead } from '../../../ui/page-head/page-head';
import { ProblemNote } from '../../../ui/problem-note/problem-note';
import { Skeleton } from '../../../ui/skeleton/skeleton';
import { StatusChip } from '../../../ui/status-chip/status-chip';
import { WeeksPage } from '../../state/weeks.actions';
import { weeksFeature } from '../../state/weeks.state';
import { TimeApiClient } from '../../time-api';
import { reloadWhenTimeChanges } from '../reload-when-time-changes';
import { WeekBar } from '../week-bar/week-bar';
import { injectWeekOfAddress } from '../week-of-address';

/** Everybody's week: a row a member, a column a day. */
@Component({
  selector: 'bm-shop-week',
  imports: [
    DateTextPipe,
    DurationPipe,
    MatAnchor,
    MatIcon,
    MoneyPipe,
    PageHead,
    ProblemNote,
    RouterLink,
    Skeleton,
    StatusChip,
    WeekBar,
  ],
  templateUrl: './shop-week.html',
  styleUrl: './shop-week.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ShopWeek {
  private readonly store = inject(Store);
  private readonly api = inject(TimeApiClient);
  protected readonly can = injectCan();
  protected readonly roleNames = ROLE_NAMES;
  protected readonly of = injectWeekOfAddress();
  protected readonly week = this.store.selectSignal(weeksFeature.selectShopWeek);

  private readonly members = computed(() => this.week().value?.members ?? []);
  /** The days' sums, in the order of the columns. */
  protected readonly daySums = computed(() =>
    (this.members()[0]?.days ?? []).map((_, day) =>
      this.members().reduce((sum, { days }) => sum + (days[day]?.workMinutes ?? 0), 0),
    ),
  );
  protected readonly seesCost = computed(() =>
    this.members().some(({ costCents }) => costCents !== undefined),
  );
  protected readonly costSum = computed(() =>
    sumCents(this.members().map(({ costCents }) => costCents ?? 0)),
  );

  constructor() {
    effect(() => this.load());
    reloadWhenTimeChanges(() => this.load());
  }

  protected load(): void {
    const of = this.of();
    untracked(() => this.store.dispatch(WeeksPage.shopWeekOpened({ of })));
  }

  protected exportUrl(startsOn: string): string {
    return this.api.weekExportUrl(startsOn);
  }
}
