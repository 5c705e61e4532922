import type { Routes } from '@angular/router';
import { provideEffects } from '@ngrx/effects';
import { provideState } from '@ngrx/store';
import { canMatchAbility } from '../platform/session/session.guards';
import { unsavedChanges } from '../ui/unsaved-changes/unsaved-changes';
import * as effects from './state/customers.effects';
import { customersFeature } from './state/customers.state';

export default [
  {
    path: '',
    providers: [provideState(customersFeature), provideEffects(effects)],
    children: [
      {
        path: '',
        pathMatch: 'full',
        title: 'Customers',
        loadComponent: () => import('./customer-list/customer-list').then(({ CustomerList }) => CustomerList),
      },
      {
        path: 'new',
        title: 'New customer',
        canMatch: [canMatchAbility('create', 'Customer')],
        canDeactivate: [unsavedChanges],
        loadComponent: () => import('./customer-form/customer-form').then(({ CustomerForm }) => CustomerForm),
      },
      {
        path: ':id',
        title: 'Customer',
        loadComponent: () =>
          import('./customer-detail/customer-detail').then(({ CustomerDetail }) => CustomerDetail),
      },
      {
        path: ':id/edit',
        title: 'Change customer',
        canMatch: [canMatchAbility('update', 'Customer')],
        canDeactivate: [unsavedChanges],
        loadComponent: () => import('./customer-form/customer-form').then(({ CustomerForm }) => CustomerForm),
      },
    ],
  },
] satisfies Routes;
