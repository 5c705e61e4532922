import { Pipe, type PipeTransform } from '@angular/core';
import { formatDuration, formatHours } from '@bookmatch/common/calendar/format';

/** `{{ entry.minutes | duration }}` reads 2 h 14 m; `duration: 'hours'` reads 2.2 h. */
@Pipe({ name: 'duration' })
export class DurationPipe implements PipeTransform {
  transform(minutes: number | null | undefined, style: 'clock' | 'hours' = 'clock'): string {
    if (minutes === null || minutes === undefined) return '';
    return style === 'clock' ? formatDuration(minutes) : formatHours(minutes);
  }
}
