import type { Routes } from '@angular/router';
import { keepUnsavedChanges } from '../../core/editing/unsaved-changes';
import { providePolicies } from '../../data/policies/provide-policies';
import { PoliciesPage } from './policies-page';

export const routes: Routes = [
  {
    path: '',
    title: $localize`What do we hold for acceptable?`,
    providers: [providePolicies()],
    canDeactivate: [keepUnsavedChanges],
    component: PoliciesPage,
  },
];
