/** What other slices may use of `time`. */
export { clockOutLeaver } from './clock-out-leaver.js';
export { ClockService } from './clock-service.js';
export { clockStateOf } from './clock-state.js';
export { clockedTime } from './clocked-time.js';
export { EntriesService } from './entries-service.js';
export { onTheClock, type ClockedIn } from './on-the-clock.js';
export { TimeEntry } from './time-entry.entity.js';
export { memberWeek, shopWeek, workMinutesThisWeek } from './weeks.js';
