import type { Routes } from '@angular/router';
import { keepUnsavedChanges } from '../../core/editing/unsaved-changes';
import { needs } from '../../core/session/session-guards';
import { provideFacilities } from '../../data/facilities/provide-facilities';
import { providePolicies } from '../../data/policies/provide-policies';
import { provideResults } from '../../data/results/provide-results';
import { provideVariants } from '../../data/variants/provide-variants';

/** Pages apart: the grid and the chart are fetched only where they are shown. */
export const routes: Routes = [
  {
    path: '',
    providers: [provideFacilities(), providePolicies(), provideResults(), provideVariants()],
    children: [
      {
        path: '',
        pathMatch: 'full',
        title: $localize`What evidence do we have, and can it be compared?`,
        loadComponent: () => import('./result-list-page').then((page) => page.ResultListPage),
      },
      {
        path: 'new',
        title: $localize`What was measured?`,
        canActivate: [needs('results.enter')],
        canDeactivate: [keepUnsavedChanges],
        loadComponent: () => import('./entry/result-entry-page').then((page) => page.ResultEntryPage),
      },
      {
        path: ':resultId',
        title: $localize`What does this result say?`,
        loadComponent: () => import('./page/result-page').then((page) => page.ResultPage),
      },
    ],
  },
];
