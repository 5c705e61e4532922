import { inject } from '@angular/core';
import type { CanMatchFn, Routes } from '@angular/router';
import { provideEffects } from '@ngrx/effects';
import { provideState } from '@ngrx/store';
import { CurrentShop } from '../platform/session/current-shop';
import { canMatchAbility } from '../platform/session/session.guards';
import { unsavedChanges } from '../ui/unsaved-changes/unsaved-changes';
import * as effects from './state/jobs.effects';
import { jobsFeature } from './state/jobs.state';

/** The crew has screens of its own at the same addresses: made for a phone, and without what it may not see. */
const isCrew: CanMatchFn = () => inject(CurrentShop).membership()?.role === 'crew';

export default [
  {
    path: '',
    providers: [provideState(jobsFeature), provideEffects(effects)],
    children: [
      {
        path: '',
        pathMatch: 'full',
        title: 'My jobs',
        canMatch: [isCrew],
        loadComponent: () => import('./my-jobs/my-jobs').then(({ MyJobs }) => MyJobs),
      },
      {
        path: '',
        pathMatch: 'full',
        title: 'Jobs',
        loadComponent: () => import('./job-list/job-list').then(({ JobList }) => JobList),
      },
      {
        path: 'board',
        title: 'Jobs by stage',
        loadComponent: () => import('./job-board/job-board').then(({ JobBoard }) => JobBoard),
      },
      {
        path: 'new',
        title: 'New job',
        canMatch: [canMatchAbility('create', 'Job')],
        canDeactivate: [unsavedChanges],
        loadComponent: () => import('./job-form/job-form').then(({ JobForm }) => JobForm),
      },
      {
        path: ':id',
        title: 'Job',
        canMatch: [isCrew],
        loadComponent: () => import('./floor-job/floor-job').then(({ FloorJob }) => FloorJob),
      },
      {
        path: ':id',
        title: 'Job',
        loadComponent: () => import('./job-detail/job-detail').then(({ JobDetail }) => JobDetail),
      },
    ],
  },
] satisfies Routes;
