import { createActionGroup, emptyProps, props } from '@ngrx/store';
import type { Programme, ProgrammeFields, ProgrammeSummary } from '#shared/contracts/programmes';
import type { ApiProblem } from '../../core/api/api-problem';

export const ProgrammesPageActions = createActionGroup({
  source: 'Programmes Page',
  events: {
    Opened: emptyProps(),
    'Asked Again': emptyProps(),
  },
});

export const ProgrammeFormPageActions = createActionGroup({
  source: 'Programme Form Page',
  events: {
    /** Without an id: for a new programme. */
    Opened: props<{ programmeId: string | undefined }>(),
    'Creation Confirmed': props<{ fields: ProgrammeFields; commandKey: string }>(),
    'Change Confirmed': props<{ programme: Programme; fields: ProgrammeFields; commandKey: string }>(),
    'Retirement Confirmed': props<{ programme: Programme; retired: boolean }>(),
    'Outcome Seen': emptyProps(),
    Left: emptyProps(),
  },
});

/** The address says which programme the person is in; the shell and the latest-programme memory follow it. */
export const ProgrammeAddressActions = createActionGroup({
  source: 'Programme Address',
  events: {
    Entered: props<{ programmeId: string }>(),
    Left: emptyProps(),
  },
});

export const ProgrammesApiActions = createActionGroup({
  source: 'Programmes API',
  events: {
    Loaded: props<{ summaries: readonly ProgrammeSummary[] }>(),
    'Loading Failed': props<{ problem: ApiProblem }>(),
    'Programme Loaded': props<{ programme: Programme }>(),
    'Programme Loading Failed': props<{ problem: ApiProblem }>(),
    Saved: props<{ programme: Programme }>(),
    Retired: props<{ programme: Programme }>(),
    'Conflict Found': props<{ theirs: Programme }>(),
    Refused: props<{ problem: ApiProblem }>(),
  },
});
