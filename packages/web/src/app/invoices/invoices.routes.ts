import type { Routes } from '@angular/router';
import { provideEffects } from '@ngrx/effects';
import { provideState } from '@ngrx/store';
import { canMatchAbility } from '../platform/session/session.guards';
import { unsavedChanges } from '../ui/unsaved-changes/unsaved-changes';
import * as effects from './state/invoices.effects';
import { invoicesFeature } from './state/invoices.state';

const form = () => import('./invoice-form/invoice-form').then(({ InvoiceForm }) => InvoiceForm);

export default [
  {
    path: '',
    providers: [provideState(invoicesFeature), provideEffects(effects)],
    children: [
      {
        path: '',
        pathMatch: 'full',
        title: 'Invoices',
        loadComponent: () => import('./invoice-list/invoice-list').then(({ InvoiceList }) => InvoiceList),
      },
      {
        path: 'aging',
        title: 'Owed by customer',
        loadComponent: () => import('./aging-report/aging-report').then(({ AgingReport }) => AgingReport),
      },
      {
        path: 'payments',
        title: 'Payments',
        canMatch: [canMatchAbility('read', 'Payment')],
        loadComponent: () => import('./payment-list/payment-list').then(({ PaymentList }) => PaymentList),
      },
      {
        path: 'new',
        title: 'New invoice',
        canMatch: [canMatchAbility('create', 'Invoice')],
        canDeactivate: [unsavedChanges],
        loadComponent: form,
      },
      {
        path: ':id',
        title: 'Invoice',
        loadComponent: () =>
          import('./invoice-detail/invoice-detail').then(({ InvoiceDetail }) => InvoiceDetail),
      },
      {
        path: ':id/edit',
        title: 'Change draft',
        canMatch: [canMatchAbility('update', 'Invoice')],
        canDeactivate: [unsavedChanges],
        loadComponent: form,
      },
    ],
  },
] satisfies Routes;
