import { createEnvironmentInjector, EnvironmentInjector, inject, Injectable } from '@angular/core';
import { provideEffects } from '@ngrx/effects';
import { provideState } from '@ngrx/store';
import * as effects from './state/clock.effects';
import { clockFeature } from './state/clock.state';

/**
 * The clock's state and effects, begun once by whatever shows the clock first: the frame, which knows no routes of this
 * slice, or the phone's screen. They live as long as the page, since what waits must be sent from every screen.
 */
@Injectable({ providedIn: 'root' })
export class ClockRuntime {
  constructor() {
    createEnvironmentInjector(
      [provideState(clockFeature), provideEffects(effects)],
      inject(EnvironmentInjector),
    );
  }
}
