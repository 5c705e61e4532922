import { InjectionToken, signal, type Signal } from '@angular/core';
import type { UnitSystem } from '@bookmatch/common/measure/unit-system';

/** The zone in which every time of the shop is shown. Wired to the session in app.config. */
export const SHOP_ZONE = new InjectionToken<Signal<string>>('SHOP_ZONE', {
  providedIn: 'root',
  factory: () => signal('UTC'),
});

/** In which unit the shop reads lengths. */
export const SHOP_UNITS = new InjectionToken<Signal<UnitSystem>>('SHOP_UNITS', {
  providedIn: 'root',
  factory: () => signal<UnitSystem>('inch'),
});

/** ISO 4217, as the shop charges. */
export const SHOP_CURRENCY = new InjectionToken<Signal<string>>('SHOP_CURRENCY', {
  providedIn: 'root',
  factory: () => signal('USD'),
});
