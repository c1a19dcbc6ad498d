import { createSelector } from '@ngrx/store';
import { applyChanges } from '#shared/core/ranking/judgement-changes';
import { compareRankings } from '#shared/core/ranking/ranking-comparison';
import { choicesOfQuery, type ChoiceName, type RankingChoices } from '#shared/core/ranking/ranking-choices';
import { confidenceOf } from '#shared/core/ranking/rank';
import type { RankingView } from '#shared/core/ranking/ranking-view';
import { chosenCycle } from '#shared/core/ranking/chosen-cycle';
import { assembleView, buildRankingView, ordersByEnergy } from '#shared/core/ranking/ranking-view-build';
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

const { selectAddress, selectGiven, selectMode, selectTried } = rankingsFeature;

/** A refusal of the whole ranking is an answer too: the page shows its words. */
function refusable<T>(compute: () => T): T | Refused {
  try {
    return compute();
  } catch (error) {
    if (error instanceof Refused) return error;
    throw error;
  }
}

/** Who tries stands beside the reasons that are tried; of whom else could the browser speak? */
const TRYING = { at: '', by: $localize`tried, not saved` };

const selectChanged = createSelector(rankingsFeature.selectSources, selectTried, (sources, tried) =>
  sources && tried.length > 0 ? refusable(() => applyChanges(sources, tried, TRYING)) : null,
);

/** What the ranking is worked out from: as it is stored, or with what is tried. */
export const selectRankedSources = createSelector(
  rankingsFeature.selectSources,
  selectChanged,
  (stored, changed) => (changed === null || changed instanceof Refused ? stored : changed),
);

/** Changes that are tried and do nothing, because what they are about has left the programme. */
export const selectWithoutSubject = createSelector(selectChanged, (changed) =>
  changed === null || changed instanceof Refused ? [] : changed.withoutSubject,
);

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

const selectInputs = createSelector(selectRankedSources, (sources) => sources?.inputs ?? null);
const selectContext = createSelector(selectRankedSources, (sources) => sources?.context ?? null);

const selectNames = createSelector(
  selectInputs,
  selectContext,
  (inputs, context) => inputs && context && namesIn(inputs, context),
);

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
  selectRankedSources,
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
  selectChanged,
  selectReduced,
  selectPicked,
  (changed, reduced, picked) => [changed, reduced, picked].find((stage) => stage instanceof Refused) ?? null,
);

/** The ranking as it is stored, for those who compute and try something. */
const selectStoredView = createSelector(
  createSelector(rankingsFeature.selectSources, selectTried, (sources, tried) =>
    tried.length > 0 ? sources : null,
  ),
  selectChoices,
  (stored, choices) => stored && refusable(() => buildRankingView(stored.inputs, stored.context, choices)),
);

/** The ranking before and after what is tried; null where nothing is, or where one of the two is refused. */
export const selectTriedRankings = createSelector(
  selectStoredView,
  selectRankingView,
  selectRankingRefusal,
  (before, after, refusal) =>
    before && !(before instanceof Refused) && after && !refusal ? { before, after } : null,
);

/** What the changes that are tried do to the ranking. */
export const selectTriedComparison = createSelector(
  selectTriedRankings,
  (rankings) => rankings && compareRankings(rankings.before, rankings.after),
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
  selectRankedSources,
  selectReduced,
  selectDrag,
  selectConfigured,
  selectCycle,
  (sources, reduced, drag, configured, cycle): DerivationSources | null =>
    sources && reduced && !(reduced instanceof Refused) && drag && configured
      ? { ...sources, reduced, drag, configured, cycle: cycle && cycle.prepared }
      : null,
);
