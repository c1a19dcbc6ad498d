import type { Combination } from '../combination/combination';
import { byCodeUnits } from '../text-order';
import { figureOf, type KeyedFigure } from '../uncertainty/budget';
import { comparablesOf, type Comparables } from './comparables';
import type { VariantEvidence } from './evidence';
import type { VariantInput } from './ranking-input';
import type { RankedCombination, RankedVariant } from './ranking-output';

/** Ascending by a number, equal ones by id. */
export function ascending<T>(
  list: readonly T[],
  valueOf: (item: T) => number,
  idOf: (item: T) => string,
): readonly T[] {
  return [...list].sort((a, b) => valueOf(a) - valueOf(b) || byCodeUnits(idOf(a), idOf(b)));
}

/** Evidence in the order of the drag areas on its basis: the ranking's own order. */
export function byDragArea(chosen: readonly VariantEvidence[]): readonly VariantEvidence[] {
  return ascending(
    chosen,
    ({ figure }) => figure.dragAreaM2,
    ({ variant }) => variant.id,
  );
}

/**
 * u of the coefficient on the variant's own frontal area: every amount over A, and under `frontal-area:<variant>` also
 * −CdA/A²·u(A) (method section 3).
 */
export function ownAreaCoefficientUncertainty(
  { dragAreaM2, budget }: KeyedFigure,
  variant: VariantInput,
): number {
  const areaM2 = variant.frontalAreaM2;
  const areaKey = `frontal-area:${variant.id}`;
  let throughArea = (-dragAreaM2 / (areaM2 * areaM2)) * (variant.frontalAreaUM2 ?? 0);
  let variance = 0;
  for (const { key, amountM2 } of budget) {
    if (key === areaKey) throughArea += amountM2 / areaM2;
    else variance += (amountM2 / areaM2) ** 2;
  }
  return Math.sqrt(variance + throughArea * throughArea);
}

function rankedCombination(combination: Combination): RankedCombination {
  const { weights, chiSquared, birgeRatio, betweenResultsVarianceM4, randomEffectsMeanM2 } = combination;
  return { weights, chiSquared, birgeRatio, betweenResultsVarianceM4, randomEffectsMeanM2 };
}

/** The ranking's rows from evidence in rank order. The common area [m²] changes coefficients only, never the order. */
export function rankedVariants(ordered: readonly VariantEvidence[], commonAreaM2: number): RankedVariant[] {
  return ordered.map(({ variant, evidence, resultIds, figure, combination }) => ({
    variantId: variant.id,
    evidence,
    resultIds,
    ...figureOf(figure),
    coefficientOnCommonArea: figure.dragAreaM2 / commonAreaM2,
    coefficientOnOwnArea: figure.dragAreaM2 / variant.frontalAreaM2,
    ownAreaCoefficientStandardUncertainty: ownAreaCoefficientUncertainty(figure, variant),
    ...(combination !== null && { combination: rankedCombination(combination) }),
  }));
}

/** Variant ids in the order of the coefficients on each variant's own area. */
export function orderByOwnAreaCoefficient(ranking: readonly RankedVariant[]): string[] {
  return ascending(
    ranking,
    (row) => row.coefficientOnOwnArea,
    (row) => row.variantId,
  ).map((row) => row.variantId);
}

/** The drag areas of a ranking laid out for comparisons, in rank order. */
export function dragComparables(ordered: readonly VariantEvidence[]): Comparables {
  return comparablesOf(
    ordered.map(({ variant, figure }) => ({
      id: variant.id,
      value: figure.dragAreaM2,
      budget: figure.budget,
      rate: 1,
    })),
  );
}
