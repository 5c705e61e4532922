import { inject, Pipe, type PipeTransform } from '@angular/core';
import { formatDate, formatInstant, formatTime } from '@bookmatch/common/calendar/format';
import { dateIn } from '@bookmatch/common/calendar/shop-dates';
import { SHOP_ZONE } from './shop-settings';

export type DateStyle = 'day' | 'day-and-time' | 'time';

const ONLY_A_DATE = /^\d{4}-\d{2}-\d{2}$/;

/**
 * `{{ lead.createdAt | dateText }}`: `Thu, Jan 14` on the wall of the shop, with the year when it is not this one.
 * Takes a date `YYYY-MM-DD`, which has no zone, or an instant in UTC.
 */
@Pipe({ name: 'dateText' })
export class DateTextPipe implements PipeTransform {
  private readonly zone = inject(SHOP_ZONE);

  transform(value: string | null | undefined, style: DateStyle = 'day'): string {
    if (!value) return '';
    const zone = this.zone();
    const today = dateIn(zone, new Date().toISOString());
    if (ONLY_A_DATE.test(value)) return formatDate(value, today);
    if (style === 'time') return formatTime(value, zone);
    return style === 'day' ? formatDate(dateIn(zone, value), today) : formatInstant(value, zone, today);
  }
}
