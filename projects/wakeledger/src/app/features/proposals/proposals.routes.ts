import type { Routes } from '@angular/router';

export const routes: Routes = [
  {
    path: '',
    pathMatch: 'full',
    title: $localize`Which changes of judgement wait for a colleague?`,
    loadComponent: () => import('./proposal-list-page').then((page) => page.ProposalListPage),
  },
  {
    path: ':proposalId',
    title: $localize`Shall this change of judgement hold?`,
    loadComponent: () => import('./proposal-page').then((page) => page.ProposalPage),
  },
];
