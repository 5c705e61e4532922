import { ChangeDetectionStrategy, Component, effect, inject, input, untracked } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatIcon } from '@angular/material/icon';
import { dateIn } from '@bookmatch/common/calendar/shop-dates';
import type { MemberWeek as Week } from '@bookmatch/common/time/week-contract';
import { Store } from '@ngrx/store';
import { injectCan } from '../../../platform/session/ability';
import { DurationPipe } from '../../../ui/formats/duration.pipe';
import { PageHead } from '../../../ui/page-head/page-head';
import { ProblemNote } from '../../../ui/problem-note/problem-note';
import { Skeleton } from '../../../ui/skeleton/skeleton';
import { EntryDialogs } from '../../entries/entry-dialogs';
import { WeeksPage } from '../../state/weeks.actions';
import { weeksFeature } from '../../state/weeks.state';
import { reloadWhenTimeChanges } from '../reload-when-time-changes';
import { WeekBar } from '../week-bar/week-bar';
import { WeekDays } from '../week-days/week-days';
import { injectWeekOfAddress } from '../week-of-address';

/** One member's week, opened from everybody's: its entries, and putting them right. */
@Component({
  selector: 'bm-member-week',
  imports: [DurationPipe, MatButton, MatIcon, PageHead, ProblemNote, Skeleton, WeekBar, WeekDays],
  templateUrl: './member-week.html',
  styleUrl: './member-week.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class MemberWeek {
  /** From the address. */
  readonly memberId = input.required<string>();

  private readonly store = inject(Store);
  protected readonly dialogs = inject(EntryDialogs);
  protected readonly can = injectCan();
  protected readonly of = injectWeekOfAddress();
  protected readonly week = this.store.selectSignal(weeksFeature.selectMemberWeek);

  constructor() {
    effect(() => this.load());
    reloadWhenTimeChanges(() => this.load());
  }

  protected load(): void {
    const asked = { memberId: this.memberId(), of: this.of() };
    untracked(() => this.store.dispatch(WeeksPage.memberWeekOpened(asked)));
  }

  /** On today when it lies in the week, otherwise on the week's first day. */
  protected add({ memberId, memberName, startsOn, endsOn, timeZone }: Week): void {
    const today = dateIn(timeZone, new Date().toISOString());
    this.dialogs.add(memberId, memberName, today >= startsOn && today <= endsOn ? today : startsOn);
  }
}
