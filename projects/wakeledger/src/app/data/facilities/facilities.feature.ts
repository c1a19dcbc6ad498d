import { createFeature, createReducer, createSelector, on } from '@ngrx/store';
import type { Facility } from '#shared/contracts/facilities';
import { NOT_ASKED, type Loading } from '../loading';
import { NOT_SAVING, type Saving } from '../saving';
import {
  FacilityFormPageActions,
  FacilityListPageActions,
  FacilityNamesActions,
  FacilityPageActions,
  FacilitiesApiActions,
} from './facilities.actions';

export interface FacilitiesState {
  readonly loading: Loading;
  /** Of the organisation, as they came: retired ones included. */
  readonly facilities: readonly Facility[];
  readonly saving: Saving<Facility>;
}

const initial: FacilitiesState = {
  loading: NOT_ASKED,
  facilities: [],
  saving: NOT_SAVING,
};

/** What is known stays in view while it is asked for anew. */
function asked(state: FacilitiesState): FacilitiesState {
  return state.loading.kind === 'ready' ? state : { ...state, loading: { kind: 'loading' } };
}

function withFacility(state: FacilitiesState, facility: Facility): FacilitiesState {
  const known = state.facilities.some(({ id }) => id === facility.id);
  const facilities = known
    ? state.facilities.map((each) => (each.id === facility.id ? facility : each))
    : [...state.facilities, facility];
  return { ...state, facilities };
}

export const facilitiesFeature = createFeature({
  name: 'facilities',
  reducer: createReducer(
    initial,
    on(
      FacilityListPageActions.opened,
      FacilityListPageActions.askedAgain,
      FacilityFormPageActions.opened,
      FacilityPageActions.opened,
      FacilityNamesActions.needed,
      asked,
    ),
    on(FacilityFormPageActions.opened, (state): FacilitiesState => ({ ...state, saving: NOT_SAVING })),
    on(FacilitiesApiActions.loaded, (state, { facilities }): FacilitiesState => ({
      ...state,
      facilities,
      loading: { kind: 'ready' },
    })),
    on(FacilitiesApiActions.loadingFailed, (state, { problem }): FacilitiesState => ({
      ...state,
      loading: { kind: 'failed', problem },
    })),
    on(
      FacilityFormPageActions.creationConfirmed,
      FacilityFormPageActions.changeConfirmed,
      FacilityFormPageActions.retirementConfirmed,
      FacilityListPageActions.retirementConfirmed,
      (state): FacilitiesState => ({ ...state, saving: { kind: 'saving' } }),
    ),
    on(FacilitiesApiActions.saved, FacilitiesApiActions.retired, (state, { facility }): FacilitiesState => ({
      ...withFacility(state, facility),
      saving: { kind: 'saved', entity: facility },
    })),
    on(FacilitiesApiActions.conflictFound, (state, { theirs }): FacilitiesState => ({
      ...withFacility(state, theirs),
      saving: { kind: 'conflict', theirs },
    })),
    on(FacilitiesApiActions.refused, (state, { problem }): FacilitiesState => ({
      ...state,
      saving: { kind: 'refused', problem },
    })),
    on(FacilityFormPageActions.outcomeSeen, FacilityFormPageActions.left, (state): FacilitiesState => ({
      ...state,
      saving: NOT_SAVING,
    })),
  ),
  extraSelectors: ({ selectFacilities }) => ({
    selectActive: createSelector(selectFacilities, (facilities) =>
      facilities.filter(({ retiredAt }) => retiredAt === undefined),
    ),
    selectRetired: createSelector(selectFacilities, (facilities) =>
      facilities.filter(({ retiredAt }) => retiredAt !== undefined),
    ),
    selectById: createSelector(
      selectFacilities,
      (facilities): ReadonlyMap<string, Facility> => new Map(facilities.map((each) => [each.id, each])),
    ),
  }),
});
