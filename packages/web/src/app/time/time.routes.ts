import { inject } from '@angular/core';
import type { CanMatchFn, Routes } from '@angular/router';
import { provideEffects } from '@ngrx/effects';
import { provideState } from '@ngrx/store';
import { CurrentShop } from '../platform/session/current-shop';
import * as effects from './state/weeks.effects';
import { weeksFeature } from './state/weeks.state';

/** At the address of everybody's week the crew finds its own. The server holds the rest of the wall. */
const seesEverybody: CanMatchFn = () => inject(CurrentShop).membership()?.role !== 'crew';
const myWeek = () => import('./week/my-week/my-week').then(({ MyWeek }) => MyWeek);

export default [
  {
    path: '',
    providers: [provideState(weeksFeature), provideEffects(effects)],
    children: [
      {
        path: '',
        pathMatch: 'full',
        title: 'Time',
        canMatch: [seesEverybody],
        loadComponent: () => import('./week/shop-week/shop-week').then(({ ShopWeek }) => ShopWeek),
      },
      { path: '', pathMatch: 'full', title: 'My week', loadComponent: myWeek },
      { path: 'mine', title: 'My week', loadComponent: myWeek },
      {
        path: 'clock',
        title: 'Clock',
        loadComponent: () => import('./clock/phone-clock/phone-clock').then(({ PhoneClock }) => PhoneClock),
      },
      {
        path: 'entries',
        title: 'Time entries',
        loadComponent: () => import('./entries/entry-list/entry-list').then(({ EntryList }) => EntryList),
      },
      {
        path: 'members/:memberId',
        title: 'Week',
        loadComponent: () => import('./week/member-week/member-week').then(({ MemberWeek }) => MemberWeek),
      },
    ],
  },
] satisfies Routes;
