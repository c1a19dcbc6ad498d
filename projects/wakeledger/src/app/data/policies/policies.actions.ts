import { createActionGroup, emptyProps, props } from '@ngrx/store';
import type { PolicyVersion } from '#shared/contracts/policies';
import type { ApiProblem } from '../../core/api/api-problem';
import type { PolicyChange } from './policies-api';

export const PoliciesPageActions = createActionGroup({
  source: 'Policies Page',
  events: {
    Opened: emptyProps(),
    'Asked Again': emptyProps(),
    'Change Confirmed': props<{ change: PolicyChange; commandKey: string }>(),
  },
});

export const PoliciesApiActions = createActionGroup({
  source: 'Policies API',
  events: {
    Loaded: props<{ versions: readonly PolicyVersion[] }>(),
    'Loading Failed': props<{ problem: ApiProblem }>(),
    Changed: props<{ version: PolicyVersion }>(),
    Refused: props<{ problem: ApiProblem }>(),
    'Changed Meanwhile': props<{ versions: readonly PolicyVersion[] }>(),
  },
});
