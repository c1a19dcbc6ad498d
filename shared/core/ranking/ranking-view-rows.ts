import { COUNT } from '../constants';
import { whPerKm } from '../road-load/cycle-energy';
import type { Figure } from '../uncertainty/figure';
import type { ContextVariant } from './ranking-context';
import type { Basis } from './ranking-input';
import type { RankedVariant, ReducedResult, VariantEnergy } from './ranking-output';
import type { ViewEnergy, ViewFigure, ViewRow, ViewStep } from './ranking-view';
import type { ConfiguredVariant } from './ranking-view-input';
import { variantName, viewContribution, viewEvidence, type RankingNames } from './ranking-view-names';

/** What a row is put together from. */
export interface RowSources {
  readonly names: RankingNames;
  readonly basis: Basis;
  readonly commonAreaM2: number;
  readonly context: ReadonlyMap<string, ContextVariant>;
  readonly configured: ReadonlyMap<string, ConfiguredVariant>;
  readonly reduced: ReadonlyMap<string, ReducedResult>;
  readonly energy: ReadonlyMap<string, VariantEnergy>;
  /** Zero-yaw figures, on which the energies stand. */
  readonly zeroYaw: ReadonlyMap<string, Figure>;
  /** A usable result newer than the adopted one in use, by variant. */
  readonly newer: ReadonlyMap<string, string>;
  readonly placeByDragArea: ReadonlyMap<string, number>;
  readonly placeByOwnArea: ReadonlyMap<string, number>;
  readonly placeByEnergy: ReadonlyMap<string, number>;
}

function viewFigure(figure: Figure): ViewFigure {
  const { dragAreaM2, standardUncertaintyM2, expandedUncertaintyM2, coverageFactor } = figure;
  const { effectiveDegreesOfFreedom } = figure;
  return {
    dragAreaM2,
    standardUncertaintyM2,
    expandedUncertaintyM2,
    coverageFactor,
    effectiveDegreesOfFreedom,
  };
}

function viewEnergy(sources: RowSources, variantId: string): ViewEnergy | null {
  const energy = sources.energy.get(variantId);
  if (!energy) return null;
  const perKm = (joules: number): number => whPerKm(joules, energy.distanceM);
  const k = sources.zeroYaw.get(variantId)?.coverageFactor ?? 2;
  return {
    wheelEnergyWhPerKm: energy.wheelEnergyWhPerKm,
    expandedUncertaintyWhPerKm: perKm(k * energy.standardUncertaintyJ),
    brakingEnergyWhPerKm: perKm(energy.brakingEnergyJ),
    whPerKmPerCount: perKm(energy.exchangeRateJPerM2 * COUNT * sources.commonAreaM2),
    f0N: energy.f0N,
    f1NPerKmh: energy.f1NPerKmh,
    f2NPerKmh2: energy.f2NPerKmh2,
  };
}

/** Step by step, the drag areas that one result passed through. Several combined results have no one such line. */
function viewSteps(sources: RowSources, resultIds: readonly string[]): readonly ViewStep[] {
  const reduced = resultIds.length === 1 ? sources.reduced.get(resultIds[0] ?? '') : undefined;
  if (!reduced) return [];
  const steps = reduced.steps.flatMap(({ step, dragAreaM2 }): readonly ViewStep[] =>
    dragAreaM2 === null ? [] : [{ step, dragAreaM2 }],
  );
  return sources.basis === 'wind-averaged' && reduced.windAveragedDragAreaM2 !== null
    ? [...steps, { step: 'yaw-ratio', dragAreaM2: reduced.windAveragedDragAreaM2 }]
    : steps;
}

function placeOf(places: ReadonlyMap<string, number>, variantId: string): number {
  return places.get(variantId) ?? 0;
}

/** One variant as the screen shows it. */
export function viewRow(
  sources: RowSources,
  ranked: RankedVariant,
  rank: number,
  probabilityLowerThanNext: number | null,
): ViewRow {
  const { names, context, configured, commonAreaM2 } = sources;
  const { variantId, resultIds } = ranked;
  const shown = context.get(variantId);
  const own = configured.get(variantId);
  const ownAreaM2 = names.variants.get(variantId)?.frontalAreaM2 ?? 1;
  const reduced = sources.reduced.get(resultIds.at(-1) ?? '');
  const newer = sources.newer.get(variantId);
  return {
    rank,
    variantId,
    name: variantName(names, variantId),
    bodyShape: shown?.bodyShape ?? 'other',
    description: shown?.description ?? '',
    lengthMm: shown?.lengthMm ?? null,
    heightMm: shown?.heightMm ?? null,
    wheelbaseMm: shown?.wheelbaseMm ?? null,
    figure: viewFigure(ranked),
    onCommonArea: {
      areaM2: commonAreaM2,
      value: ranked.dragAreaM2 / commonAreaM2,
      expandedUncertainty: ranked.expandedUncertaintyM2 / commonAreaM2,
    },
    onOwnArea: {
      areaM2: ownAreaM2,
      value: ranked.coefficientOnOwnArea,
      expandedUncertainty: ranked.coverageFactor * ranked.ownAreaCoefficientStandardUncertainty,
    },
    configuration: own?.configuration?.name ?? null,
    baseStandsIn: own?.baseStandsIn ?? false,
    massKg: own?.input.massKg ?? null,
    energy: viewEnergy(sources, variantId),
    rankByDragArea: placeOf(sources.placeByDragArea, variantId),
    rankByOwnArea: placeOf(sources.placeByOwnArea, variantId),
    rankByEnergy: sources.placeByEnergy.get(variantId) ?? null,
    probabilityLowerThanNext,
    evidence: resultIds.map((id) => viewEvidence(names, id)),
    rule: ranked.evidence,
    combination: ranked.combination ?? null,
    newer: newer === undefined ? null : viewEvidence(names, newer),
    reynolds: reduced?.reynolds ?? null,
    mach: reduced?.mach ?? null,
    blockageRatio: reduced?.blockageRatio ?? null,
    cautions: [...new Set(resultIds.flatMap((id) => sources.reduced.get(id)?.cautions ?? []))].sort(),
    steps: viewSteps(sources, resultIds),
    contributions: ranked.contributions.map((contribution) => viewContribution(names, contribution)),
  };
}
