import { BreakpointObserver } from '@angular/cdk/layout';
import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  ElementRef,
  inject,
  input,
  untracked,
} from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { MatButton } from '@angular/material/button';
import { MatDialog } from '@angular/material/dialog';
import { MatIcon } from '@angular/material/icon';
import { dateIn } from '@bookmatch/common/calendar/shop-dates';
import { Store } from '@ngrx/store';
import { map } from 'rxjs';
import { DateTextPipe } from '../../../ui/formats/date-text.pipe';
import { DurationPipe } from '../../../ui/formats/duration.pipe';
import { ProblemNote } from '../../../ui/problem-note/problem-note';
import { Skeleton } from '../../../ui/skeleton/skeleton';
import type { PunchedWork } from '../../punches/punch';
import { ClockPage } from '../../state/clock.actions';
import { ChoiceList } from '../choice-list/choice-list';
import { ClockFace } from '../clock-face';
import { KeptNote } from '../kept-note/kept-note';
import { OtherWork, type OtherWorkQuestion } from '../other-work/other-work';
import { RefusedPunch } from '../refused-punch/refused-punch';
import { RunningCard } from '../running-card/running-card';
import { injectNow } from '../ticking';

/** The clock for gloves and one thumb: what is running, large enough for an arm's length, and one touch for the rest. */
@Component({
  selector: 'bm-phone-clock',
  imports: [
    ChoiceList,
    DateTextPipe,
    DurationPipe,
    KeptNote,
    MatButton,
    MatIcon,
    ProblemNote,
    RefusedPunch,
    RunningCard,
    Skeleton,
  ],
  templateUrl: './phone-clock.html',
  styleUrl: './phone-clock.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PhoneClock {
  /** From the address: a job's page leads here to clock in to it. */
  readonly jobId = input<string>();

  protected readonly face = inject(ClockFace);
  private readonly store = inject(Store);
  private readonly dialog = inject(MatDialog);
  private readonly host = inject<ElementRef<HTMLElement>>(ElementRef).nativeElement;
  private readonly narrow = toSignal(
    inject(BreakpointObserver)
      .observe('(max-width: 599px)')
      .pipe(map(({ matches }) => matches)),
    { initialValue: false },
  );
  protected readonly now = injectNow();
  protected readonly todayMinutes = this.face.today(this.now);
  protected readonly day = computed(() => dateIn(this.face.zone(), this.now()));

  constructor() {
    this.face.open();
    // There for the time without a network, before anybody asks for it.
    this.store.dispatch(ClockPage.jobsWanted());
    const askedFor = effect(() => {
      const jobId = this.jobId();
      if (!jobId || !this.face.jobs()) return;
      askedFor.destroy();
      untracked(() => this.otherWork(jobId));
    });
  }

  /** The card stands at the top: what became of the touch is seen at once, wherever in the list it was. */
  protected clockIn(work: PunchedWork): void {
    this.face.clockIn(work, this.narrow() ? 'phone' : 'desk');
    this.host.scrollIntoView?.();
  }

  protected otherWork(jobId: string | null = null): void {
    // A job may have begun since this screen was opened; without a network the known ones stand.
    this.store.dispatch(ClockPage.jobsWanted());
    const data: OtherWorkQuestion = { jobId };
    this.dialog
      .open<OtherWork, OtherWorkQuestion, PunchedWork>(OtherWork, {
        data,
        width: '520px',
        autoFocus: 'dialog',
      })
      .afterClosed()
      .subscribe((work) => {
        if (work) this.clockIn(work);
      });
  }
}
