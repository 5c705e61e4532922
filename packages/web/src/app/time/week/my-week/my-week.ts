import { ChangeDetectionStrategy, Component, effect, inject, untracked } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { Store } from '@ngrx/store';
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

/** One's own week. */
@Component({
  selector: 'bm-my-week',
  imports: [DurationPipe, MatButton, PageHead, ProblemNote, RouterLink, Skeleton, WeekBar, WeekDays],
  templateUrl: './my-week.html',
  styleUrl: './my-week.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class MyWeek {
  private readonly store = inject(Store);
  protected readonly dialogs = inject(EntryDialogs);
  protected readonly of = injectWeekOfAddress();
  protected readonly week = this.store.selectSignal(weeksFeature.selectMemberWeek);

  constructor() {
    effect(() => this.load());
    reloadWhenTimeChanges(() => this.load());
  }

  protected load(): void {
    const of = this.of();
    untracked(() => this.store.dispatch(WeeksPage.memberWeekOpened({ memberId: null, of })));
  }
}
