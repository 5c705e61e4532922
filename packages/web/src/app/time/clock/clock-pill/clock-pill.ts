import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { MatDivider } from '@angular/material/divider';
import { MatIcon } from '@angular/material/icon';
import { MatMenu, MatMenuItem, MatMenuTrigger } from '@angular/material/menu';
import { RouterLink } from '@angular/router';
import { injectCan } from '../../../platform/session/ability';
import { DurationPipe } from '../../../ui/formats/duration.pipe';
import { runningMinutes } from '../../punches/apply-punches';
import { MEAL_BREAK, workOf } from '../../punches/punch';
import { clockFace, jobOf, whatOf } from '../../punches/work-words';
import { factsOf } from '../choice-words';
import { ClockFace } from '../clock-face';
import { injectNow } from '../ticking';

const MOST_CHOICES = 7;

/** What is clocked now, in the frame of every screen, with the way to clock in, switch and clock out. */
@Component({
  selector: 'bm-clock-pill',
  imports: [DurationPipe, MatDivider, MatIcon, MatMenu, MatMenuItem, MatMenuTrigger, RouterLink],
  templateUrl: './clock-pill.html',
  styleUrl: './clock-pill.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ClockPill {
  protected readonly face = inject(ClockFace);
  private readonly can = injectCan();
  protected readonly now = injectNow();
  protected readonly todayMinutes = this.face.today(this.now);
  protected readonly mayPunch = computed(() => this.can('create', 'TimeEntry'));
  protected readonly choices = computed(() => this.face.others().slice(0, MOST_CHOICES));
  protected readonly clock = computed(() => {
    const running = this.face.running();
    return running ? clockFace(runningMinutes(running, this.now())) : '';
  });
  protected readonly keptCount = computed(() => (this.face.waiting() ? this.face.punches().length : 0));

  protected readonly whatOf = whatOf;
  protected readonly jobOf = jobOf;
  protected readonly factsOf = factsOf;
  protected readonly workOf = workOf;
  protected readonly mealBreak = MEAL_BREAK;

  constructor() {
    if (this.mayPunch()) this.face.open();
  }
}
