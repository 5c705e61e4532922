import type { Routes } from '@angular/router';
import { provideEffects } from '@ngrx/effects';
import { provideState } from '@ngrx/store';
import { SettingsFrame } from '../shops/shops-public';
import * as effects from './state/subscription.effects';
import { subscriptionFeature } from './state/subscription.state';

export default [
  {
    path: '',
    component: SettingsFrame,
    providers: [provideState(subscriptionFeature), provideEffects(effects)],
    children: [
      {
        path: '',
        title: 'Subscription',
        loadComponent: () =>
          import('./subscription-screen/subscription-screen').then(
            ({ SubscriptionScreen }) => SubscriptionScreen,
          ),
      },
    ],
  },
] satisfies Routes;
