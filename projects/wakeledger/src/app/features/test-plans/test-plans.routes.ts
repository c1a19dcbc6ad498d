import type { Routes } from '@angular/router';
import { keepUnsavedChanges } from '../../core/editing/unsaved-changes';
import { needs } from '../../core/session/session-guards';
import { provideFacilities } from '../../data/facilities/provide-facilities';
import { provideVariants } from '../../data/variants/provide-variants';

/** Pages apart: the chart is fetched only where it is shown. */
export const routes: Routes = [
  {
    path: '',
    providers: [provideFacilities(), provideVariants()],
    children: [
      {
        path: '',
        pathMatch: 'full',
        title: $localize`Which tests are planned, and did they go as planned?`,
        loadComponent: () => import('./plan-list-page').then((page) => page.PlanListPage),
      },
      {
        path: 'new',
        title: $localize`Can this test reach what it has to?`,
        canActivate: [needs('plans.edit')],
        canDeactivate: [keepUnsavedChanges],
        loadComponent: () => import('./plan-page').then((page) => page.PlanPage),
      },
      {
        path: ':testPlanId',
        title: $localize`Can this test reach what it has to?`,
        canDeactivate: [keepUnsavedChanges],
        loadComponent: () => import('./plan-page').then((page) => page.PlanPage),
      },
      {
        path: ':testPlanId/sheet',
        title: $localize`What is to be tested?`,
        loadComponent: () => import('./plan-sheet-page').then((page) => page.PlanSheetPage),
      },
    ],
  },
];
