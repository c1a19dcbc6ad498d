import { createFeature, createReducer, createSelector, on } from '@ngrx/store';
import type { Programme, ProgrammeSummary } from '#shared/contracts/programmes';
import { type Loading, NOT_ASKED } from '../loading';
import { NOT_SAVING, type Saving } from '../saving';
import {
  ProgrammeAddressActions,
  ProgrammeFormPageActions,
  ProgrammesApiActions,
  ProgrammesPageActions,
} from './programmes.actions';

export interface ProgrammesState {
  readonly loading: Loading;
  readonly summaries: readonly ProgrammeSummary[];
  /** The programme that the address is about. */
  readonly inViewId: string | undefined;
  /** The one whose reference is read or edited. */
  readonly opened: Programme | undefined;
  readonly opening: Loading;
  readonly saving: Saving<Programme>;
}

const initial: ProgrammesState = {
  loading: NOT_ASKED,
  summaries: [],
  inViewId: undefined,
  opened: undefined,
  opening: NOT_ASKED,
  saving: NOT_SAVING,
};

/** What is known stays in view while it is asked for anew. */
function asked(state: ProgrammesState): ProgrammesState {
  return state.loading.kind === 'ready' ? state : { ...state, loading: { kind: 'loading' } };
}

/** Soonest milestone first, those without one after; by name where that decides nothing. */
function byUrgency(one: ProgrammeSummary, other: ProgrammeSummary): number {
  const [first, second] = [one.nextMilestone?.date ?? '9999', other.nextMilestone?.date ?? '9999'];
  return first < second ? -1 : first > second ? 1 : one.name.localeCompare(other.name);
}

export const programmesFeature = createFeature({
  name: 'programmes',
  reducer: createReducer(
    initial,
    on(ProgrammesPageActions.opened, ProgrammesPageActions.askedAgain, asked),
    on(ProgrammeAddressActions.entered, (state, { programmeId }): ProgrammesState => ({
      ...asked(state),
      inViewId: programmeId,
    })),
    on(ProgrammeAddressActions.left, (state): ProgrammesState => ({ ...state, inViewId: undefined })),
    on(ProgrammesApiActions.loaded, (state, { summaries }): ProgrammesState => ({
      ...state,
      summaries,
      loading: { kind: 'ready' },
    })),
    on(ProgrammesApiActions.loadingFailed, (state, { problem }): ProgrammesState => ({
      ...state,
      loading: { kind: 'failed', problem },
    })),
    on(ProgrammeFormPageActions.opened, (state, { programmeId }): ProgrammesState => ({
      ...state,
      saving: NOT_SAVING,
      opened: undefined,
      opening: programmeId === undefined ? { kind: 'ready' } : { kind: 'loading' },
    })),
    on(ProgrammesApiActions.programmeLoaded, (state, { programme }): ProgrammesState => ({
      ...state,
      opened: programme,
      opening: { kind: 'ready' },
    })),
    on(ProgrammesApiActions.programmeLoadingFailed, (state, { problem }): ProgrammesState => ({
      ...state,
      opening: { kind: 'failed', problem },
    })),
    on(
      ProgrammeFormPageActions.creationConfirmed,
      ProgrammeFormPageActions.changeConfirmed,
      ProgrammeFormPageActions.retirementConfirmed,
      (state): ProgrammesState => ({ ...state, saving: { kind: 'saving' } }),
    ),
    on(ProgrammesApiActions.saved, ProgrammesApiActions.retired, (state, { programme }): ProgrammesState => ({
      ...state,
      opened: programme,
      saving: { kind: 'saved', entity: programme },
    })),
    on(ProgrammesApiActions.conflictFound, (state, { theirs }): ProgrammesState => ({
      ...state,
      saving: { kind: 'conflict', theirs },
    })),
    on(ProgrammesApiActions.refused, (state, { problem }): ProgrammesState => ({
      ...state,
      saving: { kind: 'refused', problem },
    })),
    on(ProgrammeFormPageActions.outcomeSeen, ProgrammeFormPageActions.left, (state): ProgrammesState => ({
      ...state,
      saving: NOT_SAVING,
    })),
  ),
  extraSelectors: ({
    selectSummaries,
    selectInViewId,
    selectLoading,
    selectOpened,
    selectOpening,
    selectSaving,
  }) => {
    const selectInView = createSelector(selectSummaries, selectInViewId, (summaries, id) =>
      summaries.find((each) => each.id === id),
    );
    const selectListPage = createSelector(selectLoading, selectSummaries, (loading, summaries) => ({
      loading,
      active: summaries.filter(({ retiredAt }) => retiredAt === undefined).toSorted(byUrgency),
      retired: summaries.filter(({ retiredAt }) => retiredAt !== undefined).toSorted(byUrgency),
    }));
    const selectFormPage = createSelector(
      selectOpened,
      selectOpening,
      selectSaving,
      (opened, opening, saving) => ({
        opened,
        opening,
        saving,
      }),
    );
    return { selectInView, selectListPage, selectFormPage };
  },
});
