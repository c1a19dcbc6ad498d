import type { AirInput } from '../air/air-input';
import { prepareCycle, type PreparedCycle } from '../cycles/cycle';
import { reduceResults, type ReducedSet } from '../reduction/reduce';
import type { Reduction } from '../reduction/reduction';
import type { KeyedFigure } from '../uncertainty/budget';
import { inseparableGroups, neighbourProbabilities, type Comparables } from './comparables';
import {
  ascending,
  byDragArea,
  dragComparables,
  orderByOwnAreaCoefficient,
  rankedVariants,
} from './drag-ranking';
import { energyComparables, variantEnergies } from './energy-ranking';
import { pickEvidence, type PickedEvidence, type VariantEvidence } from './evidence';
import type { EvidenceBasis } from './ranking-choices';
import type { ContextCycle, RankingContext } from './ranking-context';
import type { Basis, RankingInput, VariantInput } from './ranking-input';
import type { RankedVariant, VariantEnergy } from './ranking-output';
import { hasRoadLoad, ruledVariants, standingAdoptions, type ConfiguredVariant } from './ranking-view-input';

/**
 * The ranking in stages, each depending on as few choices as it can, so that a screen that remembers each stage's last
 * answer works out only what a moved control changes. Every stage is one of the core's own functions, or two.
 */

/** Inputs and air: all results at the reference. No other choice comes in. */
export function reduceStage(inputs: RankingInput, referenceAir: AirInput): ReducedSet {
  return reduceResults({ ...inputs, programme: { ...inputs.programme, referenceAir } });
}

/** Adoptions, what is set aside, evidence and basis: what each variant is ranked by. */
export interface EvidenceStage extends PickedEvidence {
  /** A usable result that is newer than the adopted one in use, by variant. */
  readonly newer: ReadonlyMap<string, string>;
}

export function evidenceStage(
  variants: readonly VariantInput[],
  reduced: ReducedSet,
  context: Pick<RankingContext, 'adoptions' | 'setAside'>,
  evidence: EvidenceBasis,
  basis: Basis,
): EvidenceStage {
  const aside = new Set(context.setAside.map(({ resultId }) => resultId));
  const counting =
    aside.size === 0
      ? reduced.reductions
      : reduced.reductions.filter(({ output }) => !aside.has(output.resultId));
  const pick = (basisOfEvidence: EvidenceBasis, reductions: readonly Reduction[]): PickedEvidence =>
    pickEvidence(ruledVariants(variants, context, basisOfEvidence), { ...reduced, reductions }, basis);
  const newest = pick('newest', counting);
  if (evidence === 'newest') return { ...newest, newer: new Map() };
  const standing = standingAdoptions(context);
  const adopted = counting.filter(
    ({ output }) => standing.get(output.variantId)?.resultIds.includes(output.resultId) ?? true,
  );
  const picked = pick('adopted', adopted);
  return { ...picked, newer: newerThan(picked, newest) };
}

function newerThan(adopted: PickedEvidence, newest: PickedEvidence): ReadonlyMap<string, string> {
  const used = new Map(adopted.chosen.map(({ variant, resultIds }) => [variant.id, resultIds.at(-1)]));
  return new Map(
    newest.chosen.flatMap(({ variant, resultIds }): readonly (readonly [string, string])[] => {
      const latest = resultIds.at(-1);
      const before = used.get(variant.id);
      return latest !== undefined && before !== undefined && before !== latest ? [[variant.id, latest]] : [];
    }),
  );
}

/** Evidence alone: the order by drag area and everything that compares in it. */
export interface DragStage {
  readonly ordered: readonly VariantEvidence[];
  /** On an area of 1 m²: a coefficient on another one is the drag area over it. */
  readonly ranking: readonly RankedVariant[];
  readonly order: readonly string[];
  readonly orderByOwnArea: readonly string[];
  readonly set: Comparables;
  readonly probabilities: readonly number[];
  readonly zeroYaw: ReadonlyMap<string, KeyedFigure>;
}

export function dragStage({ chosen }: PickedEvidence): DragStage {
  const ordered = byDragArea(chosen);
  const ranking = rankedVariants(ordered, 1);
  const set = dragComparables(ordered);
  return {
    ordered,
    ranking,
    order: ranking.map(({ variantId }) => variantId),
    orderByOwnArea: orderByOwnAreaCoefficient(ranking),
    set,
    probabilities: neighbourProbabilities(set),
    zeroYaw: new Map(ordered.map(({ variant, zeroYaw }) => [variant.id, zeroYaw])),
  };
}

/** A cycle ready to be driven; null where there are no rows. */
export function cycleStage(cycle: ContextCycle | undefined): PreparedCycle | null {
  return cycle === undefined || cycle.timeS.length === 0 ? null : prepareCycle(cycle);
}

/** Drag areas, configuration, cycle and air: the energies and everything that compares them. */
export interface EnergyStage {
  /** Ascending. */
  readonly energies: readonly VariantEnergy[];
  readonly order: readonly string[];
  readonly set: Comparables;
  readonly probabilities: readonly number[];
  /** In the ranking, but without mass or rolling resistance. */
  readonly without: readonly string[];
}

export function energyStage(
  { ordered, zeroYaw }: Pick<DragStage, 'ordered' | 'zeroYaw'>,
  configured: readonly ConfiguredVariant[],
  cycle: PreparedCycle,
  airDensityKgM3: number,
  rotatingFactor: number | null | undefined,
): EnergyStage {
  const inputOf = new Map(configured.map(({ input }) => [input.id, input]));
  const candidates = ordered.map((evidence) => ({
    variant: inputOf.get(evidence.variant.id) ?? evidence.variant,
    zeroYaw: evidence.zeroYaw,
  }));
  const able = candidates.filter(({ variant }) => hasRoadLoad(variant));
  const energies = ascending(
    variantEnergies(able, { cycle, airDensityKgM3, rotatingFactor }),
    ({ wheelEnergyJ }) => wheelEnergyJ,
    ({ variantId }) => variantId,
  );
  const set = energyComparables(energies, zeroYaw);
  return {
    energies,
    order: energies.map(({ variantId }) => variantId),
    set,
    probabilities: neighbourProbabilities(set),
    without: candidates.filter(({ variant }) => !hasRoadLoad(variant)).map(({ variant }) => variant.id),
  };
}

/** The shown order and the confidence: who cannot be told apart. */
export function groupStage(set: Comparables, confidence: number): readonly (readonly string[])[] {
  return inseparableGroups(set, confidence);
}
