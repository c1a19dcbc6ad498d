import { createActionGroup, emptyProps } from '@ngrx/store';

export const SessionActions = createActionGroup({
  source: 'Session',
  events: {
    /** Another person or another organisation: nothing held for the former one may stay. */
    'Member Changed': emptyProps(),
  },
});
