import type { Routes } from '@angular/router';
import { needs, signedIn } from './core/session/session-guards';
import { Shell } from './core/shell/shell';

/**
 * Every page, loaded when it is first opened. A page registers its own line here, with its question as the title, what
 * it needs (`canActivate: [needs('results.read')]`) and, for a form, `canDeactivate: [keepUnsavedChanges]`.
 */
export const routes: Routes = [
  {
    path: '',
    component: Shell,
    canActivate: [signedIn],
    children: [
      { path: '', pathMatch: 'full', redirectTo: 'programmes' },
      {
        path: 'programmes',
        title: $localize`Which programmes need you today?`,
        loadComponent: () =>
          import('./features/programmes/programme-list-page').then((page) => page.ProgrammeListPage),
      },
      {
        path: 'programmes/new',
        title: $localize`What will the new programme compare on?`,
        canActivate: [needs('programmes.edit')],
        loadChildren: () => import('./features/programmes/programme-form.routes').then((file) => file.routes),
      },
      {
        path: 'programmes/:programmeId/settings',
        title: $localize`What does this programme compare on?`,
        canActivate: [needs('programmes.read')],
        loadChildren: () => import('./features/programmes/programme-form.routes').then((file) => file.routes),
      },
      {
        path: 'programmes/:programmeId/ranking',
        title: $localize`Which variant drags most?`,
        canActivate: [needs('ranking-inputs.read', 'ranking-view.read')],
        loadChildren: () => import('./features/rankings/rankings.routes').then((file) => file.routes),
      },
      {
        path: 'programmes/:programmeId/variants',
        canActivate: [needs('variants.read')],
        loadChildren: () => import('./features/variants/variants.routes').then((file) => file.routes),
      },
      {
        path: 'programmes/:programmeId/results',
        canActivate: [needs('results.read')],
        loadChildren: () => import('./features/results/results.routes').then((file) => file.routes),
      },
      {
        path: 'programmes/:programmeId/proposals',
        canActivate: [needs('proposals.read')],
        loadChildren: () => import('./features/proposals/proposals.routes').then((file) => file.routes),
      },
      {
        path: 'programmes/:programmeId/test-plans',
        canActivate: [needs('plans.read')],
        loadChildren: () => import('./features/test-plans/test-plans.routes').then((file) => file.routes),
      },
      {
        path: 'programmes/:programmeId/import',
        canActivate: [needs('imports.run')],
        loadChildren: () => import('./features/imports/imports.routes').then((file) => file.routes),
      },
      {
        path: 'facilities',
        canActivate: [needs('facilities.read')],
        loadChildren: () => import('./features/facilities/facilities.routes').then((file) => file.routes),
      },
      {
        path: 'adjustments',
        canActivate: [needs('facilities.read')],
        loadChildren: () => import('./features/adjustments/adjustments.routes').then((file) => file.routes),
      },
      {
        path: 'correlations',
        canActivate: [needs('facilities.read')],
        loadChildren: () => import('./features/correlations/correlations.routes').then((file) => file.routes),
      },
      {
        path: 'policies',
        canActivate: [needs('policies.read')],
        loadChildren: () => import('./features/policies/policies.routes').then((file) => file.routes),
      },
      {
        path: 'cycles',
        canActivate: [needs('cycles.read')],
        loadChildren: () => import('./features/cycles/cycles.routes').then((file) => file.routes),
      },
      {
        path: 'for-scripts',
        title: $localize`How do scripts talk to Wakeledger?`,
        loadComponent: () =>
          import('./features/api-reference/api-reference-page').then((page) => page.ApiReferencePage),
      },
    ],
  },
  {
    path: 'sign-in',
    title: $localize`Who is keeping the account?`,
    loadComponent: () => import('./features/sign-in/sign-in-page').then((page) => page.SignInPage),
  },
  {
    path: 'set-password',
    title: $localize`Which password will be yours?`,
    loadComponent: () => import('./features/sign-in/set-password-page').then((page) => page.SetPasswordPage),
  },
  {
    path: 'unavailable',
    title: $localize`The server cannot be reached`,
    loadComponent: () => import('./core/errors/error-page').then((page) => page.ErrorPage),
    data: { kind: 'unavailable' },
  },
  {
    path: 'not-yours',
    title: $localize`Your role does not include this page`,
    loadComponent: () => import('./core/errors/error-page').then((page) => page.ErrorPage),
    data: { kind: 'not-yours' },
  },
  {
    path: '**',
    title: $localize`There is nothing at this address`,
    loadComponent: () => import('./core/errors/error-page').then((page) => page.ErrorPage),
    data: { kind: 'not-found' },
  },
];
