import type { Routes } from '@angular/router';
import { provideEffects } from '@ngrx/effects';
import { provideState } from '@ngrx/store';
import { canMatchAbility } from '../platform/session/session.guards';
import { unsavedChanges } from '../ui/unsaved-changes/unsaved-changes';
import * as effects from './state/estimates.effects';
import { estimatesFeature } from './state/estimates.state';

export default [
  {
    path: '',
    providers: [provideState(estimatesFeature), provideEffects(effects)],
    children: [
      {
        path: '',
        pathMatch: 'full',
        title: 'Estimates',
        loadComponent: () => import('./estimate-list/estimate-list').then(({ EstimateList }) => EstimateList),
      },
      {
        path: 'new',
        title: 'New estimate',
        canMatch: [canMatchAbility('create', 'Estimate')],
        canDeactivate: [unsavedChanges],
        loadComponent: () => import('./estimate-form/estimate-form').then(({ EstimateForm }) => EstimateForm),
      },
      {
        path: ':id',
        title: 'Estimate',
        canDeactivate: [unsavedChanges],
        loadComponent: () => import('./estimate-page/estimate-page').then(({ EstimatePage }) => EstimatePage),
      },
      {
        path: ':id/revisions/:revisionId',
        title: 'Revision',
        loadComponent: () => import('./revision-page/revision-page').then(({ RevisionPage }) => RevisionPage),
      },
    ],
  },
] satisfies Routes;
