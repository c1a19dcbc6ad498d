import { createActionGroup, emptyProps, props } from '@ngrx/store';
import type { Facility, FacilityChange, FacilityFields } from '#shared/contracts/facilities';
import type { ApiProblem } from '../../core/api/api-problem';

export const FacilityListPageActions = createActionGroup({
  source: 'Facility List Page',
  events: {
    Opened: emptyProps(),
    'Asked Again': emptyProps(),
    'Retirement Confirmed': props<{ facility: Facility; retired: boolean }>(),
  },
});

export const FacilityPageActions = createActionGroup({
  source: 'Facility Page',
  events: { Opened: emptyProps() },
});

export const FacilityFormPageActions = createActionGroup({
  source: 'Facility Form Page',
  events: {
    Opened: emptyProps(),
    'Creation Confirmed': props<{ fields: FacilityFields; commandKey: string }>(),
    'Change Confirmed': props<{ facility: Facility; fields: FacilityChange; commandKey: string }>(),
    'Retirement Confirmed': props<{ facility: Facility; retired: boolean }>(),
    'Outcome Seen': emptyProps(),
    Left: emptyProps(),
  },
});

/** Pages of other domains that show facilities by name. */
export const FacilityNamesActions = createActionGroup({
  source: 'Facility Names',
  events: { Needed: emptyProps() },
});

export const FacilitiesApiActions = createActionGroup({
  source: 'Facilities API',
  events: {
    Loaded: props<{ facilities: readonly Facility[] }>(),
    'Loading Failed': props<{ problem: ApiProblem }>(),
    Saved: props<{ facility: Facility }>(),
    Retired: props<{ facility: Facility }>(),
    'Conflict Found': props<{ theirs: Facility }>(),
    Refused: props<{ problem: ApiProblem }>(),
  },
});
