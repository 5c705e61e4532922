import { computed, inject, Injectable, type Signal } from '@angular/core';
import type { InstantText } from '@bookmatch/common/calendar/shop-dates';
import { Store } from '@ngrx/store';
import { CurrentShop } from '../../platform/session/current-shop';
import { ClockRuntime } from '../clock-runtime';
import { workToday } from '../punches/apply-punches';
import { isSameWork, workOf, type PunchedWork } from '../punches/punch';
import { PunchMaker } from '../punches/punch-maker';
import { ClockPage } from '../state/clock.actions';
import { clockFeature } from '../state/clock.state';

/** What every face of the clock shows and does: the frame's, and the phone's screen. */
@Injectable({ providedIn: 'root' })
export class ClockFace {
  private readonly runtime = inject(ClockRuntime);
  private readonly store = inject(Store);
  private readonly shop = inject(CurrentShop);
  private readonly maker = inject(PunchMaker);

  readonly zone = this.shop.timeZone;
  readonly readOnly = this.shop.readOnly;
  readonly server = this.store.selectSignal(clockFeature.selectServer);
  readonly problem = this.store.selectSignal(clockFeature.selectProblem);
  readonly jobs = this.store.selectSignal(clockFeature.selectJobs);
  readonly running = this.store.selectSignal(clockFeature.selectRunning);
  readonly punches = this.store.selectSignal(clockFeature.selectPunches);
  readonly refused = this.store.selectSignal(clockFeature.selectRefused);
  readonly waiting = this.store.selectSignal(clockFeature.selectWaiting);
  private readonly clock = this.store.selectSignal(clockFeature.selectClock);
  private readonly choices = this.store.selectSignal(clockFeature.selectChoices);

  /** What one can switch to: everything but what is running. */
  readonly others = computed(() => {
    const running = this.running();
    return this.choices().filter((choice) => !running || !isSameWork(running.work, workOf(choice)));
  });
  readonly onBreak = computed(() => this.running()?.work.kind === 'meal-break');
  /** What the member worked on last, by this device's own punches or by the server: one touch brings them back to it. */
  readonly last = computed((): PunchedWork | null => {
    const kept = this.clock().closed.findLast(({ work }) => work.kind === 'work');
    const recent = this.others().find((choice) => choice.recent);
    return kept?.work ?? (recent ? workOf(recent) : null);
  });

  open(): void {
    this.store.dispatch(ClockPage.opened());
  }

  today(now: Signal<InstantText>): Signal<number> {
    return computed(() => workToday(this.server(), this.clock(), now(), this.zone()));
  }

  clockIn(work: PunchedWork, source: 'phone' | 'desk'): void {
    const punch = this.maker.clockIn(work, this.running(), source);
    this.store.dispatch(ClockPage.punched({ punch }));
  }

  /** @param at when the work really stopped; now when left out */
  clockOut(at?: InstantText): void {
    const running = this.running();
    if (running) this.store.dispatch(ClockPage.punched({ punch: this.maker.clockOut(running, at) }));
  }
}
