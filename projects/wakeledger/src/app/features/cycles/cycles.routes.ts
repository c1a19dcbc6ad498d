import type { Routes } from '@angular/router';
import { keepUnsavedChanges } from '../../core/editing/unsaved-changes';
import { needs } from '../../core/session/session-guards';
import { provideCycles } from '../../data/cycles/provide-cycles';
import { CycleListPage } from './cycle-list-page';

export const routes: Routes = [
  {
    path: '',
    providers: [provideCycles()],
    children: [
      { path: '', title: $localize`Which speed traces is energy computed on?`, component: CycleListPage },
      {
        path: 'new',
        title: $localize`Is your speed trace read as you mean it?`,
        canActivate: [needs('cycles.edit')],
        canDeactivate: [keepUnsavedChanges],
        loadComponent: () => import('./cycle-upload-page').then((page) => page.CycleUploadPage),
      },
    ],
  },
];
