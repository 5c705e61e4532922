import type { Routes } from '@angular/router';
import { provideEffects } from '@ngrx/effects';
import { provideState } from '@ngrx/store';
import * as effects from './state/own-sessions.effects';
import { ownSessionsFeature } from './state/own-sessions.state';

/** Inside a shop's frame, where the person's menu leads. */
export default [
  {
    path: '',
    title: 'My account',
    providers: [provideState(ownSessionsFeature), provideEffects(effects)],
    loadComponent: () => import('./my-account/my-account').then(({ MyAccount }) => MyAccount),
  },
] satisfies Routes;
