import { createFeature, createReducer, on } from '@ngrx/store';
import type { JudgementChange } from '#shared/contracts/proposals';
import type { ChoiceQuery } from '#shared/core/ranking/ranking-choices';
import type { RankingView } from '#shared/core/ranking/ranking-view';
import { type Loading, NOT_ASKED } from '../loading';
import type { RankingSources } from './rankings-api';
import { type RankingMode, RankingPageActions, RankingsApiActions, TryingActions } from './rankings.actions';

export interface RankingsState {
  readonly programmeId: string;
  readonly mode: RankingMode;
  /** The choices as they stand in the address. */
  readonly address: ChoiceQuery;
  readonly loading: Loading;
  /** For those who compute: everything that any choice needs. */
  readonly sources: RankingSources | null;
  /** For the others: the server's view of the latest choices. */
  readonly given: RankingView | null;
  /** Changes of judgement that are tried, in the order in which they came. */
  readonly tried: readonly JudgementChange[];
}

const initialState: RankingsState = {
  programmeId: '',
  mode: 'is-given',
  address: {},
  loading: NOT_ASKED,
  sources: null,
  given: null,
  tried: [],
};

export const rankingsFeature = createFeature({
  name: 'rankings',
  reducer: createReducer(
    initialState,
    on(RankingPageActions.opened, (state, { programmeId, mode, address }): RankingsState => {
      const same = state.programmeId === programmeId && state.mode === mode;
      return {
        programmeId,
        mode,
        address,
        loading: { kind: 'loading' },
        sources: same ? state.sources : null,
        given: same ? state.given : null,
        tried: same ? state.tried : [],
      };
    }),
    on(RankingPageActions.addressChanged, (state, { address }): RankingsState => ({
      ...state,
      address,
      // Without sources those who compute ask anew too: an area in the address may be what was missing.
      loading: state.mode === 'is-given' || !state.sources ? { kind: 'loading' } : state.loading,
    })),
    on(RankingPageActions.retryPressed, (state): RankingsState => ({
      ...state,
      loading: { kind: 'loading' },
    })),
    on(TryingActions.changed, (state, { programmeId, changes }): RankingsState =>
      programmeId === state.programmeId ? { ...state, tried: changes } : state,
    ),
    on(RankingsApiActions.sourcesLoaded, (state, { programmeId, sources }): RankingsState =>
      programmeId === state.programmeId ? { ...state, sources, loading: { kind: 'ready' } } : state,
    ),
    on(RankingsApiActions.viewLoaded, (state, { programmeId, view }): RankingsState =>
      programmeId === state.programmeId ? { ...state, given: view, loading: { kind: 'ready' } } : state,
    ),
    on(
      RankingsApiActions.sourcesFailed,
      RankingsApiActions.viewFailed,
      (state, { programmeId, problem }): RankingsState =>
        programmeId === state.programmeId ? { ...state, loading: { kind: 'failed', problem } } : state,
    ),
  ),
});
