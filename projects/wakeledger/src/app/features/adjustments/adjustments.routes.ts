import type { Routes } from '@angular/router';
import { keepUnsavedChanges } from '../../core/editing/unsaved-changes';
import { needs } from '../../core/session/session-guards';
import { AdjustmentFormPage } from './adjustment-form-page';
import { AdjustmentListPage } from './adjustment-list-page';

export const routes: Routes = [
  {
    path: '',
    pathMatch: 'full',
    title: $localize`What is a difference of the test condition worth?`,
    component: AdjustmentListPage,
  },
  {
    path: 'new',
    title: $localize`What is this difference worth, and how sure is that?`,
    canActivate: [needs('adjustments.edit')],
    canDeactivate: [keepUnsavedChanges],
    component: AdjustmentFormPage,
  },
  {
    path: ':adjustmentId',
    title: $localize`What is this difference worth, and how sure is that?`,
    canActivate: [needs('adjustments.edit')],
    canDeactivate: [keepUnsavedChanges],
    component: AdjustmentFormPage,
  },
];
