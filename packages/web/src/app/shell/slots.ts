import { InjectionToken, type Type } from '@angular/core';

/** A component that a slice fills in for the frame, loaded after the first screen. */
export type Slot = () => Promise<Type<unknown>>;

/** At the right of the top bar: what is clocked now, and the button for it. */
export const CLOCK_SLOT = new InjectionToken<Slot | null>('CLOCK_SLOT', {
  providedIn: 'root',
  factory: () => null,
});

/** Above the screen: how the shop's own subscription stands. */
export const BANNER_SLOT = new InjectionToken<Slot | null>('BANNER_SLOT', {
  providedIn: 'root',
  factory: () => null,
});
