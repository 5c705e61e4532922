import type { Routes } from '@angular/router';
import { provideEffects } from '@ngrx/effects';
import { provideState } from '@ngrx/store';
import { canMatchAbility } from '../platform/session/session.guards';
import { unsavedChanges } from '../ui/unsaved-changes/unsaved-changes';
import * as membersEffects from './state/members.effects';
import { membersFeature } from './state/members.state';
import * as operationsEffects from './state/operations.effects';
import { operationsFeature } from './state/operations.state';
import * as settingsEffects from './state/settings.effects';
import { settingsFeature } from './state/settings.state';

export default [
  {
    path: '',
    providers: [
      provideState(settingsFeature),
      provideState(membersFeature),
      provideState(operationsFeature),
      provideEffects(settingsEffects, membersEffects, operationsEffects),
    ],
    loadComponent: () => import('./settings-frame/settings-frame').then(({ SettingsFrame }) => SettingsFrame),
    children: [
      { path: '', pathMatch: 'full', redirectTo: 'shop' },
      {
        path: 'shop',
        title: 'Shop',
        canDeactivate: [unsavedChanges],
        loadComponent: () => import('./shop-settings/shop-settings').then(({ ShopSettings }) => ShopSettings),
      },
      {
        path: 'members',
        title: 'Members',
        canMatch: [canMatchAbility('read', 'Member')],
        loadComponent: () => import('./members/members').then(({ Members }) => Members),
      },
      {
        path: 'operations',
        title: 'Operations',
        canMatch: [canMatchAbility('read', 'Operation')],
        loadComponent: () => import('./operations/operations').then(({ Operations }) => Operations),
      },
      {
        path: 'card-payments',
        title: 'Card payments',
        canMatch: [canMatchAbility('read', 'PaymentAccount')],
        loadComponent: () => import('./card-payments/card-payments').then(({ CardPayments }) => CardPayments),
      },
    ],
  },
] satisfies Routes;
