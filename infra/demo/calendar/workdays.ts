import { addDays, daysBetween, type DateText } from '@bookmatch/common/calendar/shop-dates';

/**
 * The shop's working days, counted back from today: 0 is today, or the last working day before a weekend or a holiday,
 * -1 the working day before that. What a plan says in these numbers is the same plan on whatever day it is made.
 */
export class Workdays {
  private readonly dates: DateText[] = [];
  private readonly coming: DateText[] = [];

  constructor(readonly today: DateText) {}

  /** Above 0 are the working days to come. */
  dateOf(index: number): DateText {
    while (this.dates.length <= -index) this.dates.push(this.before(this.dates.at(-1)));
    while (this.coming.length < index) this.coming.push(after(this.coming.at(-1) ?? this.today));
    return index > 0 ? this.coming[index - 1]! : this.dates[-index]!;
  }

  /** Whether work on `index` goes on into the next calendar day: no weekend or holiday lies between. */
  isFollowedByWork(index: number): boolean {
    return index < 0 && daysBetween(this.dateOf(index), this.dateOf(index + 1)) === 1;
  }

  private before(later: DateText | undefined): DateText {
    let date = later === undefined ? this.today : addDays(later, -1);
    while (!isWorkday(date)) date = addDays(date, -1);
    return date;
  }
}

function after(earlier: DateText): DateText {
  let date = addDays(earlier, 1);
  while (!isWorkday(date)) date = addDays(date, 1);
  return date;
}

function isWorkday(date: DateText): boolean {
  const weekday = new Date(`${date}T00:00:00Z`).getUTCDay();
  return weekday !== 0 && weekday !== 6 && !isHoliday(date, weekday);
}

const HOLIDAYS = new Set(['01-01', '07-04', '12-24', '12-25', '12-31']);

/** The shop closes on a few fixed days, and on the fourth Thursday of November with the Friday after it. */
function isHoliday(date: DateText, weekday: number): boolean {
  const [month, day] = [date.slice(5, 7), Number(date.slice(8))];
  if (HOLIDAYS.has(date.slice(5))) return true;
  return (
    month === '11' && ((weekday === 4 && day > 21 && day < 29) || (weekday === 5 && day > 22 && day < 30))
  );
}
