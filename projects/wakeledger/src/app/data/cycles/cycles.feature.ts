import { createFeature, createReducer, createSelector, on } from '@ngrx/store';
import type { CycleSummary } from '#shared/contracts/cycles';
import type { ApiProblem } from '../../core/api/api-problem';
import { type Loading, NOT_ASKED } from '../loading';
import { CycleUploadPageActions, CyclesApiActions, CyclesPageActions } from './cycles.actions';

export interface CyclesState {
  readonly loading: Loading;
  readonly cycles: readonly CycleSummary[];
  /** Why the latest retirement was refused. */
  readonly refusal: ApiProblem | undefined;
}

const initial: CyclesState = { loading: NOT_ASKED, cycles: [], refusal: undefined };

function withCycle(state: CyclesState, cycle: CycleSummary): CyclesState {
  const known = state.cycles.some(({ key }) => key === cycle.key);
  const cycles = known
    ? state.cycles.map((each) => (each.key === cycle.key ? cycle : each))
    : [...state.cycles, cycle];
  return { ...state, cycles, refusal: undefined };
}

export const cyclesFeature = createFeature({
  name: 'cycles',
  reducer: createReducer(
    initial,
    on(CyclesPageActions.opened, CyclesPageActions.askedAgain, (state): CyclesState => ({
      ...state,
      refusal: undefined,
      loading: state.loading.kind === 'ready' ? state.loading : { kind: 'loading' },
    })),
    on(CyclesApiActions.loaded, (state, { cycles }): CyclesState => ({
      ...state,
      cycles,
      loading: { kind: 'ready' },
    })),
    on(CyclesApiActions.loadingFailed, (state, { problem }): CyclesState => ({
      ...state,
      loading: { kind: 'failed', problem },
    })),
    on(CyclesApiActions.retired, CycleUploadPageActions.stored, (state, { cycle }): CyclesState =>
      withCycle(state, cycle),
    ),
    on(CyclesApiActions.refused, (state, { problem }): CyclesState => ({ ...state, refusal: problem })),
  ),
  extraSelectors: ({ selectCyclesState, selectCycles }) => ({
    selectListPage: createSelector(selectCyclesState, selectCycles, ({ loading, refusal }, cycles) => ({
      loading,
      refusal,
      builtIn: cycles.filter(({ origin }) => origin === 'built-in'),
      own: cycles.filter(({ origin, retiredAt }) => origin === 'own' && retiredAt === undefined),
      retired: cycles.filter(({ retiredAt }) => retiredAt !== undefined),
    })),
  }),
});
