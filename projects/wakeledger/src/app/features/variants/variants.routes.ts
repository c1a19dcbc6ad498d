import type { Routes } from '@angular/router';
import { keepUnsavedChanges } from '../../core/editing/unsaved-changes';
import { needs } from '../../core/session/session-guards';
import { provideVariants } from '../../data/variants/provide-variants';
import { VariantFormPage } from './variant-form-page';
import { VariantListPage } from './variant-list-page';

export const routes: Routes = [
  {
    path: '',
    providers: [provideVariants()],
    children: [
      {
        path: '',
        pathMatch: 'full',
        title: $localize`Which variants does this programme compare?`,
        component: VariantListPage,
      },
      {
        path: 'new',
        title: $localize`Which variant is to be compared?`,
        canActivate: [needs('variants.edit')],
        canDeactivate: [keepUnsavedChanges],
        component: VariantFormPage,
      },
      {
        path: ':variantId',
        title: $localize`What is this variant?`,
        canDeactivate: [keepUnsavedChanges],
        component: VariantFormPage,
      },
    ],
  },
];
