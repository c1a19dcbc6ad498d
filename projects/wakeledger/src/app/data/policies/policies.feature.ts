import { createFeature, createReducer, createSelector, on } from '@ngrx/store';
import type { PolicyVersion } from '#shared/contracts/policies';
import { type Loading, NOT_ASKED } from '../loading';
import { NOT_SAVING, type Saving } from '../saving';
import { PoliciesApiActions, PoliciesPageActions } from './policies.actions';

export interface PoliciesState {
  readonly loading: Loading;
  /** Newest first; the first is in force. */
  readonly versions: readonly PolicyVersion[];
  readonly saving: Saving<PolicyVersion>;
}

const initial: PoliciesState = { loading: NOT_ASKED, versions: [], saving: NOT_SAVING };

function asked(state: PoliciesState): PoliciesState {
  return { ...state, loading: state.loading.kind === 'ready' ? state.loading : { kind: 'loading' } };
}

export const policiesFeature = createFeature({
  name: 'policies',
  reducer: createReducer(
    initial,
    on(PoliciesPageActions.opened, (state): PoliciesState => ({ ...asked(state), saving: NOT_SAVING })),
    on(PoliciesPageActions.askedAgain, asked),
    on(PoliciesApiActions.loaded, (state, { versions }): PoliciesState => ({
      ...state,
      versions,
      loading: { kind: 'ready' },
    })),
    on(PoliciesApiActions.loadingFailed, (state, { problem }): PoliciesState => ({
      ...state,
      loading: { kind: 'failed', problem },
    })),
    on(PoliciesPageActions.changeConfirmed, (state): PoliciesState => ({
      ...state,
      saving: { kind: 'saving' },
    })),
    on(PoliciesApiActions.changed, (state, { version }): PoliciesState => ({
      ...state,
      versions: [version, ...state.versions],
      saving: { kind: 'saved', entity: version },
    })),
    on(PoliciesApiActions.refused, (state, { problem }): PoliciesState => ({
      ...state,
      saving: { kind: 'refused', problem },
    })),
    on(PoliciesApiActions.changedMeanwhile, (state, { versions }): PoliciesState => {
      const [theirs] = versions;
      return { ...state, versions, saving: theirs ? { kind: 'conflict', theirs } : NOT_SAVING };
    }),
  ),
  extraSelectors: ({ selectVersions }) => ({
    /** The version in force; undefined until it has come. */
    selectInForce: createSelector(selectVersions, ([newest]) => newest),
    /** Its limits, which results are checked against. */
    selectLimits: createSelector(selectVersions, ([newest]) => newest?.values),
  }),
});
