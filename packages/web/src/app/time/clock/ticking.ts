import { DestroyRef, inject, signal, type Signal } from '@angular/core';
import type { InstantText } from '@bookmatch/common/calendar/shop-dates';

/** Now, moving on by the second while the component lives. */
export function injectNow(): Signal<InstantText> {
  const now = signal(new Date().toISOString());
  const timer = setInterval(() => now.set(new Date().toISOString()), 1000);
  inject(DestroyRef).onDestroy(() => clearInterval(timer));
  return now.asReadonly();
}
