import type { ActionReducer } from '@ngrx/store';
import { SessionActions } from './session.actions';

/** Puts every slice back to its beginning when the member changes, so that no tenant's data outlives the switch. */
export function forgetOnMemberChange<S>(reducer: ActionReducer<S>): ActionReducer<S> {
  return (state, action) =>
    reducer(action.type === SessionActions.memberChanged.type ? undefined : state, action);
}
