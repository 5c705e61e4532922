import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  linkedSignal,
  output,
} from '@angular/core';
import { MatIcon } from '@angular/material/icon';
import { dateIn, type InstantText } from '@bookmatch/common/calendar/shop-dates';
import { formatDuration } from '@bookmatch/common/calendar/format';
import { DateTextPipe } from '../../../ui/formats/date-text.pipe';
import { SHOP_ZONE } from '../../../ui/formats/shop-settings';
import { runningMinutes, type Running } from '../../punches/apply-punches';
import type { PunchedWork } from '../../punches/punch';
import { clockFace, jobOf, whatOf } from '../../punches/work-words';
import { StoppedEarlier } from '../stopped-earlier/stopped-earlier';

/** Longer than a long day: somebody may have gone home without clocking out. */
const LONG_MINUTES = 12 * 60;

/** What is running, or that nothing is, readable at arm's length; and the one button that matters. */
@Component({
  selector: 'bm-running-card',
  imports: [DateTextPipe, MatIcon, StoppedEarlier],
  templateUrl: './running-card.html',
  styleUrl: './running-card.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { '[class]': 'state()' },
})
export class RunningCard {
  readonly running = input.required<Running | null>();
  /** What the member did before: offered when nothing runs, and after a break. */
  readonly last = input<PunchedWork | null>(null);
  readonly now = input.required<InstantText>();
  readonly disabled = input(false);
  /** With an instant when the work stopped earlier than now. */
  readonly clockedOut = output<InstantText | undefined>();
  readonly clockedIn = output<PunchedWork>();

  private readonly zone = inject(SHOP_ZONE);
  protected readonly whatOf = whatOf;
  protected readonly jobOf = jobOf;
  protected readonly state = computed(() => {
    const running = this.running();
    return running ? running.work.kind : 'off';
  });
  protected readonly minutes = computed(() => {
    const running = this.running();
    return running ? runningMinutes(running, this.now()) : 0;
  });
  protected readonly clock = computed(() => clockFace(this.minutes()));
  protected readonly spoken = computed(() => formatDuration(this.minutes()));
  /** The day is named when it is not today's. */
  protected readonly sinceToday = computed(() => {
    const running = this.running();
    return !running || dateIn(this.zone(), running.startedAt) === dateIn(this.zone(), this.now());
  });
  protected readonly isLong = computed(() => this.minutes() >= LONG_MINUTES);
  /** Asked for of its own accord after a long day; put away by the person. */
  protected readonly asksForEnd = linkedSignal(() => this.isLong());
}
