import type { DateText } from '@bookmatch/common/calendar/shop-dates';
import type { Workdays } from '../calendar/workdays.js';
import { instantAt, type WallMinute } from '../calendar/wall-clock.js';
import type { Generator } from '../chance/generator.js';
import type { WorkdayIndex } from '../plan/project.js';

/** Turns the plan's days into moments on the wall of the shop. */
export class When {
  constructor(
    private readonly zone: string,
    private readonly days: Workdays,
    private readonly random: Generator,
    /** Nothing happens after this. */
    readonly now: Date,
  ) {}

  get today(): DateText {
    return this.days.today;
  }

  /** A moment near an hour of a working day; null for what has not come. The same question gets the same answer. */
  near(day: WorkdayIndex, hour: number): Date | null {
    if (day > 0) return null;
    const minute = hour * 60 + this.random.stream(`${day} ${hour}`).whole(0, 40);
    const at = this.at(day, minute);
    return at < this.now ? at : null;
  }

  at(day: WorkdayIndex, minute: WallMinute): Date {
    return instantAt(this.zone, this.days.dateOf(day), minute);
  }

  /** The date of a working day, also of one to come. */
  date(day: WorkdayIndex): DateText {
    return this.days.dateOf(day);
  }

  isFollowedByWork(day: WorkdayIndex): boolean {
    return this.days.isFollowedByWork(day);
  }
}
