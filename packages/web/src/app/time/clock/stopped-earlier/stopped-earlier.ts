import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  linkedSignal,
  output,
} from '@angular/core';
import { dateIn, type InstantText } from '@bookmatch/common/calendar/shop-dates';
import { refuseClockOut } from '@bookmatch/common/time/clock-rules';
import { instantOnWall } from '@bookmatch/common/time/wall-time';
import { SHOP_ZONE } from '../../../ui/formats/shop-settings';

let asked = 0;

/** Asks when the work really stopped, for whoever forgot to clock out. */
@Component({
  selector: 'bm-stopped-earlier',
  template: `
    <p [id]="questionId">When did you stop?</p>
    <div class="fields" role="group" [attr.aria-labelledby]="questionId">
      <input #day type="date" aria-label="Day" [value]="on()" (input)="on.set(day.value)" />
      <input #time type="time" aria-label="Time" [value]="at()" (input)="at.set(time.value)" />
    </div>
    <p class="wrong" role="alert">{{ shown() }}</p>
    <div class="actions">
      <button type="button" class="plain" (click)="closed.emit()">Not now</button>
      <button type="button" class="sure" (click)="stop()">Clock out then</button>
    </div>
  `,
  styleUrl: './stopped-earlier.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class StoppedEarlier {
  readonly running = input.required<{ startedAt: InstantText }>();
  readonly now = input.required<InstantText>();
  readonly stopped = output<InstantText>();
  readonly closed = output();

  private readonly zone = inject(SHOP_ZONE);
  protected readonly questionId = `bm-stopped-earlier-${asked++}`;
  /** The day the work began, until another is given. */
  protected readonly on = linkedSignal(() => dateIn(this.zone(), this.running().startedAt));
  protected readonly at = linkedSignal({ source: this.running, computation: () => '' });
  private readonly pressed = linkedSignal({ source: () => [this.on(), this.at()], computation: () => false });

  private readonly instant = computed(() => instantOnWall(this.zone(), this.on(), this.at()));
  private readonly wrong = computed(() => {
    const instant = this.instant();
    if (!instant) return 'Give the day and the time.';
    const { startedAt } = this.running();
    return refuseClockOut(instant, this.now(), { startedAt, endedAt: null })?.detail ?? '';
  });
  protected readonly shown = computed(() => (this.pressed() ? this.wrong() : ''));

  protected stop(): void {
    const instant = this.instant();
    if (instant && !this.wrong()) this.stopped.emit(instant);
    else this.pressed.set(true);
  }
}
