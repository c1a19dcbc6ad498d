import type { Routes } from '@angular/router';
import { keepUnsavedChanges } from '../../core/editing/unsaved-changes';
import { needs } from '../../core/session/session-guards';
import { CorrelationFormPage } from './correlation-form-page';
import { CorrelationListPage } from './correlation-list-page';
import { CorrelationPage } from './correlation-page';

export const routes: Routes = [
  {
    path: '',
    pathMatch: 'full',
    title: $localize`How is one facility brought to another?`,
    component: CorrelationListPage,
  },
  {
    path: 'new',
    title: $localize`Which pairs bring one facility to another?`,
    canActivate: [needs('correlations.edit')],
    canDeactivate: [keepUnsavedChanges],
    component: CorrelationFormPage,
  },
  {
    path: ':correlationId',
    title: $localize`What does this correlation say, and since when is it used?`,
    canActivate: [needs('results.read')],
    component: CorrelationPage,
  },
  {
    path: ':correlationId/new-version',
    title: $localize`Which pairs does the next version rest on?`,
    canActivate: [needs('correlations.edit')],
    canDeactivate: [keepUnsavedChanges],
    component: CorrelationFormPage,
  },
];
