import type { Routes } from '@angular/router';
import { provideEffects } from '@ngrx/effects';
import { provideState } from '@ngrx/store';
import * as effects from './state/ledger.effects';
import { ledgerFeature } from './state/ledger.state';

export default [
  {
    path: '',
    providers: [provideState(ledgerFeature), provideEffects(effects)],
    children: [
      {
        path: '',
        pathMatch: 'full',
        title: 'Ledger',
        loadComponent: () => import('./trial-balance/trial-balance').then(({ TrialBalance }) => TrialBalance),
      },
      {
        path: 'entries',
        title: 'Ledger entries',
        loadComponent: () => import('./entry-list/entry-list').then(({ EntryList }) => EntryList),
      },
      {
        path: 'entries/:id',
        title: 'Ledger entry',
        loadComponent: () => import('./entry-detail/entry-detail').then(({ EntryDetail }) => EntryDetail),
      },
      {
        path: 'accounts/:code',
        title: 'Account',
        loadComponent: () =>
          import('./account-activity/account-activity').then(({ AccountActivity }) => AccountActivity),
      },
    ],
  },
] satisfies Routes;
