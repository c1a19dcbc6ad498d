import type { Routes } from '@angular/router';
import { signedIn } from './core/session/session-guards';
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
    children: [{ path: '', pathMatch: 'full', redirectTo: 'programmes' }],
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
