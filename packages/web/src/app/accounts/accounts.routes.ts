import type { Routes } from '@angular/router';

/** Outside of any shop; the letters' links lead here too. */
export default [
  {
    path: 'sign-in',
    title: 'Sign in',
    loadComponent: () => import('./sign-in/sign-in').then(({ SignIn }) => SignIn),
  },
  {
    path: 'sign-up',
    title: 'Open your shop',
    loadComponent: () => import('./sign-up/sign-up').then(({ SignUp }) => SignUp),
  },
  {
    path: 'confirm-email',
    title: 'Confirm your e-mail address',
    loadComponent: () => import('./confirm-email/confirm-email').then(({ ConfirmEmail }) => ConfirmEmail),
  },
  {
    path: 'forgot-password',
    title: 'Choose a new password',
    loadComponent: () =>
      import('./forgot-password/forgot-password').then(({ ForgotPassword }) => ForgotPassword),
  },
  {
    path: 'reset-password',
    title: 'Choose a new password',
    loadComponent: () => import('./reset-password/reset-password').then(({ ResetPassword }) => ResetPassword),
  },
  {
    path: 'accept-invitation',
    title: 'Join a shop',
    loadComponent: () =>
      import('./accept-invitation/accept-invitation').then(({ AcceptInvitation }) => AcceptInvitation),
  },
] satisfies Routes;
