import { createSelector } from '@ngrx/store';
import { choicesOfQuery, type ChoiceName, type RankingChoices } from '#shared/core/ranking/ranking-choices';
import { confidenceOf } from '#shared/core/ranking/rank';
import type { RankingView } from '#shared/core/ranking/ranking-view';
import { chosenCycle } from '#shared/core/ranking/chosen-cycle';
import { assembleView, ordersByEnergy } from '#shared/core/ranking/ranking-view-build';
import {
  chosenAir,
  configuredVariants,
  type ConfiguredVariant,
} from '#shared/core/ranking/ranking-view-input';
import { namesIn } from '#shared/core/ranking/ranking-view-names';
import {
  cycleStage,
  dragStage,
  energyStage,
  evidenceStage,
  groupStage,
  reduceStage,
  type DragStage,
} from '#shared/core/ranking/ranking-view-stages';
import { Refused } from '#shared/core/refusal';
import type { PreparedCycle } from '#shared/core/cycles/cycle';
import type { RankingContext } from '#shared/core/ranking/ranking-context';
import type { RankingInput } from '#shared/core/ranking/ranking-input';
import type { ReducedSet } from '#shared/core/reduction/reduce';
import { rankingsFeature } from './rankings.feature';

const { selectAddress, selectSources, selectGiven, selectMode } = rankingsFeature;

/** One choice, and no other: by the text in the address, so that it stays the same while others change. */
function choice<Name extends ChoiceName>(name: Name) {
  return createSelector(
    createSelector(selectAddress, (address) => address[name]),
    (text): RankingChoices[Name] => choicesOfQuery({ [name]: text }).choices[name],
  );
}

const selectOrder = choice('order');
const selectCycleKey = choice('cycle');
const selectAir = choice('air');
const selectEvidenceBasis = choice('evidence');
const selectBasis = choice('basis');
const selectConfiguration = choice('configuration');
const selectConfidence = choice('confidence');

const selectInputs = createSelector(selectSources, (sources) => sources?.inputs ?? null);
const selectContext = createSelector(selectSources, (sources) => sources?.context ?? null);

const selectNames = createSelector(
  selectInputs,
  selectContext,
  (inputs, context) => inputs && context && namesIn(inputs, context),
);

/** A refusal of the whole ranking is an answer too: the page shows its words. */
function refusable<T>(compute: () => T): T | Refused {
  try {
    return compute();
  } catch (error) {
    if (error instanceof Refused) return error;
    throw error;
  }
}

/** Exported for the tests that hold it to its promise: only inputs and air bring it to work. */
export const selectReduced = createSelector(
  selectInputs,
  selectAir,
  (inputs, air) =>
    inputs &&
    refusable(() =>
      reduceStage(inputs, chosenAir(air, inputs.programme.referenceAir) ?? inputs.programme.referenceAir),
    ),
);

/** A weighted mean can refuse, where a result has no uncertainty of its own to be weighed by. */
const selectPicked = createSelector(
  selectInputs,
  selectContext,
  selectReduced,
  selectEvidenceBasis,
  selectBasis,
  (inputs, context, reduced, evidence, basis) =>
    inputs && context && reduced && !(reduced instanceof Refused)
      ? refusable(() => evidenceStage(inputs.variants, reduced, context, evidence, basis))
      : null,
);

export const selectEvidence = createSelector(selectPicked, (picked) =>
  picked instanceof Refused ? null : picked,
);

export const selectDrag = createSelector(selectEvidence, (evidence) => evidence && dragStage(evidence));

const selectConfigured = createSelector(
  selectInputs,
  selectContext,
  selectConfiguration,
  (inputs, context, configuration) =>
    inputs && context && configuredVariants(inputs.variants, context.variants, configuration),
);

export const selectCycle = createSelector(selectContext, selectCycleKey, (context, key) => {
  const offer = context ? chosenCycle(context.cycles, key) : undefined;
  const prepared = cycleStage(offer);
  return offer && prepared ? { offer, prepared } : null;
});

const selectAirDensity = createSelector(selectReduced, (reduced) =>
  reduced && !(reduced instanceof Refused) ? reduced.context.referenceAir.densityKgM3 : null,
);

export const selectEnergy = createSelector(
  selectDrag,
  selectConfigured,
  selectCycle,
  selectAirDensity,
  selectInputs,
  (drag, configured, cycle, airDensityKgM3, inputs) =>
    drag && configured && cycle && airDensityKgM3 !== null && inputs
      ? energyStage(drag, configured, cycle.prepared, airDensityKgM3, inputs.programme.rotatingFactor)
      : null,
);

const selectGroups = createSelector(
  selectInputs,
  selectDrag,
  selectEnergy,
  selectOrder,
  selectConfidence,
  (inputs, drag, energy, order, confidence) =>
    inputs && drag
      ? groupStage(
          ordersByEnergy(order, energy) ? energy.set : drag.set,
          confidence ?? confidenceOf(inputs.programme),
        )
      : null,
);

const selectChoices = createSelector(selectAddress, (address) => choicesOfQuery(address).choices);

/** The view that this browser works out; null until the inputs are there. */
const selectComputed = createSelector(
  selectSources,
  selectChoices,
  selectNames,
  selectConfigured,
  selectReduced,
  selectEvidence,
  selectDrag,
  createSelector(selectCycle, selectEnergy, selectGroups, (cycle, energy, groups) => ({
    cycle,
    energy,
    groups,
  })),
  (sources, choices, names, configured, reduced, evidence, drag, { cycle, energy, groups }) =>
    sources && names && configured && reduced && !(reduced instanceof Refused) && evidence && drag && groups
      ? assembleView({
          ...sources,
          choices,
          names,
          configured,
          reduced,
          evidence,
          drag,
          cycle,
          energy,
          groups,
        })
      : null,
);

/** The ranking as it is shown, whoever worked it out. */
export const selectRankingView = createSelector(
  selectMode,
  selectComputed,
  selectGiven,
  (mode, computed, given): RankingView | null => (mode === 'computes' ? computed : given),
);

/** Why the method refuses to rank at all, for those who compute. */
export const selectRankingRefusal = createSelector(
  selectReduced,
  selectPicked,
  (reduced, picked) => [reduced, picked].find((stage) => stage instanceof Refused) ?? null,
);

/** What the derivation of a figure is made from, by those who hold the inputs; null for the others. */
export interface DerivationSources {
  readonly inputs: RankingInput;
  readonly context: RankingContext;
  readonly reduced: ReducedSet;
  readonly drag: DragStage;
  readonly configured: readonly ConfiguredVariant[];
  readonly cycle: PreparedCycle | null;
}

export const selectDerivationSources = createSelector(
  selectSources,
  selectReduced,
  selectDrag,
  selectConfigured,
  selectCycle,
  (sources, reduced, drag, configured, cycle): DerivationSources | null =>
    sources && reduced && !(reduced instanceof Refused) && drag && configured
      ? { ...sources, reduced, drag, configured, cycle: cycle && cycle.prepared }
      : null,
);
