import type { Routes } from '@angular/router';
import { keepUnsavedChanges } from '../../core/editing/unsaved-changes';
import { needs } from '../../core/session/session-guards';
import { provideFacilities } from '../../data/facilities/provide-facilities';
import { FacilityFormPage } from './facility-form-page';
import { FacilityListPage } from './facility-list-page';
import { FacilityPage } from './facility-page';

export const routes: Routes = [
  {
    path: '',
    providers: [provideFacilities()],
    children: [
      {
        path: '',
        pathMatch: 'full',
        title: $localize`Where does evidence come from, and how sure is it?`,
        component: FacilityListPage,
      },
      {
        path: 'new',
        title: $localize`Where will evidence come from?`,
        canActivate: [needs('facilities.edit')],
        canDeactivate: [keepUnsavedChanges],
        component: FacilityFormPage,
      },
      {
        path: ':facilityId',
        title: $localize`How sure is what this facility says?`,
        component: FacilityPage,
      },
      {
        path: ':facilityId/edit',
        title: $localize`What changes at this facility?`,
        canActivate: [needs('facilities.edit')],
        canDeactivate: [keepUnsavedChanges],
        component: FacilityFormPage,
      },
    ],
  },
];
