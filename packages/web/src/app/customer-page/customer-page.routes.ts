import type { Routes } from '@angular/router';
import { provideEffects } from '@ngrx/effects';
import { provideState } from '@ngrx/store';
import * as invoiceEffects from './invoice-state/invoice-page.effects';
import { invoicePageFeature } from './invoice-state/invoice-page.state';
import * as effects from './state/customer-page.effects';
import { customerPageFeature } from './state/customer-page.state';

export default [
  {
    path: ':token',
    providers: [
      provideState(customerPageFeature),
      provideState(invoicePageFeature),
      provideEffects(effects, invoiceEffects),
    ],
    loadComponent: () =>
      import('./customer-screen/customer-screen').then(({ CustomerScreen }) => CustomerScreen),
  },
] satisfies Routes;
