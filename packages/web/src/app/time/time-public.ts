import type { Type } from '@angular/core';

/** What other slices and the frame may use of `time`; all of it is loaded when it is first shown. */

/** The clock in the frame. */
export const clockSlot = (): Promise<Type<unknown>> =>
  import('./clock/clock-pill/clock-pill').then(({ ClockPill }) => ClockPill);

/** The clock as a whole screen: the crew's first page. */
export const phoneClock = (): Promise<Type<unknown>> =>
  import('./clock/phone-clock/phone-clock').then(({ PhoneClock }) => PhoneClock);
