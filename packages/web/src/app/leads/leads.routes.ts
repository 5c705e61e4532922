import type { Routes } from '@angular/router';
import { provideEffects } from '@ngrx/effects';
import { provideState } from '@ngrx/store';
import { canMatchAbility } from '../platform/session/session.guards';
import { unsavedChanges } from '../ui/unsaved-changes/unsaved-changes';
import { LeadMoves } from './lead-moves';
import * as effects from './state/leads.effects';
import { leadsFeature } from './state/leads.state';

export default [
  {
    path: '',
    providers: [provideState(leadsFeature), provideEffects(effects), LeadMoves],
    children: [
      {
        path: '',
        pathMatch: 'full',
        title: 'Leads',
        loadComponent: () => import('./lead-list/lead-list').then(({ LeadList }) => LeadList),
      },
      {
        path: 'board',
        title: 'Leads by stage',
        loadComponent: () => import('./lead-board/lead-board').then(({ LeadBoard }) => LeadBoard),
      },
      {
        path: 'new',
        title: 'New lead',
        canMatch: [canMatchAbility('create', 'Lead')],
        canDeactivate: [unsavedChanges],
        loadComponent: () => import('./lead-form/lead-form').then(({ LeadForm }) => LeadForm),
      },
      {
        path: ':id',
        title: 'Lead',
        canDeactivate: [unsavedChanges],
        loadComponent: () => import('./lead-detail/lead-detail').then(({ LeadDetail }) => LeadDetail),
      },
      {
        path: ':id/edit',
        title: 'Change lead',
        canMatch: [canMatchAbility('update', 'Lead')],
        canDeactivate: [unsavedChanges],
        loadComponent: () => import('./lead-form/lead-form').then(({ LeadForm }) => LeadForm),
      },
    ],
  },
] satisfies Routes;
