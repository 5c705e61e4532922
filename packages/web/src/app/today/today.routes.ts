import { inject } from '@angular/core';
import { Router, type CanActivateFn, type Routes } from '@angular/router';
import { provideEffects } from '@ngrx/effects';
import { provideState } from '@ngrx/store';
import { CurrentShop } from '../platform/session/current-shop';
import * as effects from './state/today.effects';
import { todayFeature } from './state/today.state';

/** The crew's first page is the clock. */
const crewToTheClock: CanActivateFn = () =>
  inject(CurrentShop).membership()?.role !== 'crew' || inject(Router).parseUrl('/time/clock');

export default [
  {
    path: '',
    pathMatch: 'full',
    title: 'Today',
    canActivate: [crewToTheClock],
    providers: [provideState(todayFeature), provideEffects(effects)],
    loadComponent: () => import('./today-page/today-page').then(({ TodayScreen }) => TodayScreen),
  },
] satisfies Routes;
