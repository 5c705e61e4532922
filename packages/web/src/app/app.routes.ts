import type { Routes } from '@angular/router';
import { canMatchAbility, memberHere, signedIn } from './platform/session/session.guards';

/** Below `/s/<slug>/`: the screens of one shop, inside the frame. A slice's own routes say who may open them. */
export const shopRoutes: Routes = [
  {
    path: '',
    loadComponent: () => import('./shell/frame/frame').then(({ Frame }) => Frame),
    canActivate: [signedIn, memberHere],
    children: [
      { path: '', pathMatch: 'full', redirectTo: 'today' },
      { path: 'today', loadChildren: () => import('./today/today.routes') },
      {
        path: 'leads',
        canMatch: [canMatchAbility('read', 'Lead')],
        loadChildren: () => import('./leads/leads.routes'),
      },
      {
        path: 'estimates',
        canMatch: [canMatchAbility('read', 'Estimate')],
        loadChildren: () => import('./estimates/estimates.routes'),
      },
      {
        path: 'jobs',
        canMatch: [canMatchAbility('read', 'Job')],
        loadChildren: () => import('./jobs/jobs.routes'),
      },
      {
        path: 'time',
        canMatch: [canMatchAbility('read', 'TimeEntry')],
        loadChildren: () => import('./time/time.routes'),
      },
      {
        path: 'invoices',
        canMatch: [canMatchAbility('read', 'Invoice')],
        loadChildren: () => import('./invoices/invoices.routes'),
      },
      {
        path: 'customers',
        canMatch: [canMatchAbility('read', 'Customer')],
        loadChildren: () => import('./customers/customers.routes'),
      },
      {
        path: 'ledger',
        canMatch: [canMatchAbility('read', 'LedgerEntry')],
        loadChildren: () => import('./ledger/ledger.routes'),
      },
      {
        path: 'settings/subscription',
        canMatch: [canMatchAbility('read', 'Subscription')],
        loadChildren: () => import('./subscription/subscription.routes'),
      },
      {
        path: 'settings',
        canMatch: [canMatchAbility('read', 'Shop')],
        loadChildren: () => import('./shops/shops.routes'),
      },
      { path: 'account', loadChildren: () => import('./accounts/own-account.routes') },
      {
        path: 'no-access',
        title: 'Not for your role',
        loadComponent: () => import('./shell/no-access/no-access').then(({ NoAccess }) => NoAccess),
      },
      {
        path: '**',
        title: 'Not found',
        loadComponent: () => import('./shell/not-found/not-found').then(({ NotFound }) => NotFound),
      },
    ],
  },
];

/** Outside of any shop: the front door, signing in and up, and what a customer sees behind a link. */
export const outsideRoutes: Routes = [
  {
    path: '',
    pathMatch: 'full',
    canActivate: [signedIn],
    loadComponent: () => import('./shell/front-door/front-door').then(({ FrontDoor }) => FrontDoor),
  },
  { path: 'c', loadChildren: () => import('./customer-page/customer-page.routes') },
  { path: '', loadChildren: () => import('./accounts/accounts.routes') },
  {
    path: '**',
    title: 'Not found',
    loadComponent: () => import('./shell/not-found/not-found').then(({ NotFound }) => NotFound),
  },
];
