import type { Routes } from '@angular/router';

export const routes: Routes = [
  {
    path: '',
    pathMatch: 'full',
    title: $localize`Which file do you bring in?`,
    loadComponent: () => import('./import-list-page').then((page) => page.ImportListPage),
  },
  {
    path: ':importId',
    title: $localize`Is this file read as you mean it?`,
    loadComponent: () => import('./import-page').then((page) => page.ImportPage),
  },
];
