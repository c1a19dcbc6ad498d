import { createFeature, createReducer, createSelector, on } from '@ngrx/store';
import type { Variant } from '#shared/contracts/variants';
import { NOT_ASKED, type Loading } from '../loading';
import { NOT_SAVING, type Saving } from '../saving';
import {
  VariantFormPageActions,
  VariantListPageActions,
  VariantNamesActions,
  VariantsApiActions,
} from './variants.actions';

export interface VariantsState {
  readonly programmeId: string | undefined;
  readonly loading: Loading;
  /** Of one programme, as they came: retired ones included. */
  readonly variants: readonly Variant[];
  readonly saving: Saving<Variant>;
}

const initial: VariantsState = {
  programmeId: undefined,
  loading: NOT_ASKED,
  variants: [],
  saving: NOT_SAVING,
};

/** Another programme's variants are forgotten at once; the same programme's stay in view while they are asked for anew. */
function asked(state: VariantsState, { programmeId }: { programmeId: string }): VariantsState {
  const same = state.programmeId === programmeId;
  return {
    ...(same ? state : initial),
    programmeId,
    loading: same && state.loading.kind === 'ready' ? state.loading : { kind: 'loading' },
  };
}

function withVariant(state: VariantsState, variant: Variant): VariantsState {
  if (variant.programmeId !== state.programmeId) return state;
  const known = state.variants.some(({ id }) => id === variant.id);
  const variants = known
    ? state.variants.map((each) => (each.id === variant.id ? variant : each))
    : [...state.variants, variant];
  return { ...state, variants };
}

export const variantsFeature = createFeature({
  name: 'variants',
  reducer: createReducer(
    initial,
    on(
      VariantListPageActions.opened,
      VariantListPageActions.askedAgain,
      VariantFormPageActions.opened,
      VariantNamesActions.needed,
      asked,
    ),
    on(VariantFormPageActions.opened, (state): VariantsState => ({ ...state, saving: NOT_SAVING })),
    on(VariantsApiActions.loaded, (state, { programmeId, variants }): VariantsState =>
      programmeId === state.programmeId ? { ...state, variants, loading: { kind: 'ready' } } : state,
    ),
    on(VariantsApiActions.loadingFailed, (state, { problem }): VariantsState => ({
      ...state,
      loading: { kind: 'failed', problem },
    })),
    on(
      VariantFormPageActions.creationConfirmed,
      VariantFormPageActions.changeConfirmed,
      VariantFormPageActions.retirementConfirmed,
      VariantListPageActions.retirementConfirmed,
      (state): VariantsState => ({ ...state, saving: { kind: 'saving' } }),
    ),
    on(VariantsApiActions.saved, VariantsApiActions.retired, (state, { variant }): VariantsState => ({
      ...withVariant(state, variant),
      saving: { kind: 'saved', entity: variant },
    })),
    on(VariantsApiActions.conflictFound, (state, { theirs }): VariantsState => ({
      ...withVariant(state, theirs),
      saving: { kind: 'conflict', theirs },
    })),
    on(VariantsApiActions.refused, (state, { problem }): VariantsState => ({
      ...state,
      saving: { kind: 'refused', problem },
    })),
    on(VariantFormPageActions.outcomeSeen, VariantFormPageActions.left, (state): VariantsState => ({
      ...state,
      saving: NOT_SAVING,
    })),
  ),
  extraSelectors: ({ selectVariants }) => ({
    selectActive: createSelector(selectVariants, (variants) =>
      variants.filter(({ retiredAt }) => retiredAt === undefined),
    ),
    selectRetired: createSelector(selectVariants, (variants) =>
      variants.filter(({ retiredAt }) => retiredAt !== undefined),
    ),
    selectById: createSelector(
      selectVariants,
      (variants): ReadonlyMap<string, Variant> => new Map(variants.map((each) => [each.id, each])),
    ),
  }),
});
