import { createFeature, createReducer, createSelector, on } from '@ngrx/store';
import type { Programme } from '#shared/contracts/programmes';
import type { Adoption } from '#shared/contracts/adoptions';
import type { Result } from '#shared/contracts/results';
import type { RankingInput } from '#shared/core/ranking/ranking-input';
import type { ApiProblem } from '../../core/api/api-problem';
import { NOT_ASKED, type Loading } from '../loading';
import type { EvidenceDone } from './evidence-decision';
import { reducedEvidence } from './reduced-evidence';
import {
  ResultEntryPageActions,
  ResultListPageActions,
  ResultPageActions,
  ResultsApiActions,
} from './results.actions';

/** What a person did with a result, and how far that has come. */
export type Deed =
  | { readonly kind: 'none' }
  | { readonly kind: 'under-way' }
  | { readonly kind: 'entered'; readonly result: Result }
  | { readonly kind: 'decided'; readonly done: EvidenceDone }
  | { readonly kind: 'refused'; readonly problem: ApiProblem };

export interface ResultsState {
  readonly programmeId: string | undefined;
  readonly loading: Loading;
  readonly programme: Programme | undefined;
  /** Withdrawn ones included. */
  readonly results: readonly Result[];
  /** Newest first. */
  readonly adoptions: readonly Adoption[];
  readonly inputs: RankingInput | null;
  readonly inputsProblem: ApiProblem | null;
  readonly deed: Deed;
}

const initial: ResultsState = {
  programmeId: undefined,
  loading: NOT_ASKED,
  programme: undefined,
  results: [],
  adoptions: [],
  inputs: null,
  inputsProblem: null,
  deed: { kind: 'none' },
};

/** Another programme's results are forgotten at once; the same programme's stay in view while they are asked for anew. */
function asked(state: ResultsState, { programmeId }: { programmeId: string }): ResultsState {
  const same = state.programmeId === programmeId;
  return {
    ...(same ? state : initial),
    programmeId,
    loading: same && state.loading.kind === 'ready' ? state.loading : { kind: 'loading' },
    deed: { kind: 'none' },
  };
}

function withResult(results: readonly Result[], result: Result): readonly Result[] {
  return results.some(({ id }) => id === result.id)
    ? results.map((each) => (each.id === result.id ? result : each))
    : [...results, result];
}

/** Until the server answers anew: what rests on what, as the adoptions themselves say. */
function withAdoptions(results: readonly Result[], adoptions: readonly Adoption[]): readonly Result[] {
  const chosen = new Map(adoptions.map(({ variantId, resultIds }) => [variantId, resultIds]));
  return results.map((result) => {
    const resultIds = chosen.get(result.variantId);
    return resultIds === undefined ? result : { ...result, adopted: resultIds.includes(result.id) };
  });
}

/** What a decision changed, in view before the server has told everything anew. */
function withDone(state: ResultsState, done: EvidenceDone): ResultsState {
  switch (done.kind) {
    case 'checked':
    case 'withdrawn':
      return { ...state, results: done.results.reduce(withResult, state.results) };
    case 'judged': {
      const judged = new Map(done.judgements.map(({ resultId, ...judgement }) => [resultId, judgement]));
      const results = state.results.map((result) => {
        const judgement = judged.get(result.id);
        return judgement === undefined ? result : { ...result, judgement };
      });
      return { ...state, results };
    }
    case 'adopted':
      return {
        ...state,
        adoptions: [...done.adoptions, ...state.adoptions],
        results: withAdoptions(state.results, done.adoptions),
      };
  }
}

export const resultsFeature = createFeature({
  name: 'results',
  reducer: createReducer(
    initial,
    on(
      ResultListPageActions.opened,
      ResultListPageActions.askedAgain,
      ResultPageActions.opened,
      ResultEntryPageActions.opened,
      asked,
    ),
    on(ResultsApiActions.loaded, (state, { programmeId, answer }): ResultsState =>
      programmeId === state.programmeId ? { ...state, ...answer, loading: { kind: 'ready' } } : state,
    ),
    on(ResultsApiActions.loadingFailed, (state, { problem }): ResultsState => ({
      ...state,
      loading: { kind: 'failed', problem },
    })),
    on(
      ResultPageActions.decisionConfirmed,
      ResultListPageActions.decisionConfirmed,
      ResultEntryPageActions.entryConfirmed,
      (state): ResultsState => ({ ...state, deed: { kind: 'under-way' } }),
    ),
    on(ResultsApiActions.entered, (state, { result }): ResultsState => ({
      ...state,
      results: withResult(state.results, result),
      deed: { kind: 'entered', result },
    })),
    on(ResultsApiActions.decided, (state, { done }): ResultsState => ({
      ...withDone(state, done),
      deed: { kind: 'decided', done },
    })),
    on(ResultsApiActions.refused, (state, { problem }): ResultsState => ({
      ...state,
      deed: { kind: 'refused', problem },
    })),
    on(
      ResultPageActions.outcomeSeen,
      ResultListPageActions.outcomeSeen,
      ResultEntryPageActions.outcomeSeen,
      (state): ResultsState => ({ ...state, deed: { kind: 'none' } }),
    ),
  ),
  extraSelectors: ({ selectInputs, selectAdoptions }) => ({
    /** Every result brought to the reference, by its id; made anew only when the inputs change. */
    selectReduced: createSelector(selectInputs, reducedEvidence),
    /** The adoption that stands, by variant; one that was released has none. */
    selectStanding: createSelector(selectAdoptions, (adoptions): ReadonlyMap<string, Adoption> => {
      const newest = new Map<string, Adoption>();
      for (const adoption of adoptions) {
        if (!newest.has(adoption.variantId)) newest.set(adoption.variantId, adoption);
      }
      return new Map([...newest].filter(([, { resultIds }]) => resultIds.length > 0));
    }),
  }),
});
