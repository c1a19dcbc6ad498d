import type { Routes } from '@angular/router';
import { keepUnsavedChanges } from '../../core/editing/unsaved-changes';
import { provideFacilities } from '../../data/facilities/provide-facilities';
import { provideVariants } from '../../data/variants/provide-variants';
import { ProgrammeFormPage } from './programme-form-page';

/** The form shows variants and facilities by name, hence their slices. */
export const routes: Routes = [
  {
    path: '',
    component: ProgrammeFormPage,
    canDeactivate: [keepUnsavedChanges],
    providers: [provideFacilities(), provideVariants()],
  },
];
