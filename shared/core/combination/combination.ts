import { refuse } from '../refusal';
import { amount, budgetOf, scaled, standardUncertainty, type KeyedFigure } from '../uncertainty/budget';
import { ownPartsOf } from './own-parts';
import { randomEffects, sum, weightedMean } from './random-effects';

/** The weighted mean of several figures of one geometry, with what it says about their agreement (method section 10). */
export interface Combination {
  readonly figure: KeyedFigure;
  /** One a figure, summing to 1. */
  readonly weights: readonly number[];
  /** Of each figure's own part [m²]. */
  readonly unsharedStandardUncertaintyM2: readonly number[];
  readonly sharedKeys: readonly string[];
  /** 1/√Σ(1/u²) over the own parts [m²]. */
  readonly internalStandardUncertaintyM2: number;
  readonly chiSquared: number;
  /** √(χ²/(n − 1)); null for one figure. Above 1 the own parts do not explain the scatter, and the mean is widened. */
  readonly birgeRatio: number | null;
  /** After DerSimonian and Laird, shown beside the mean [m⁴, m²]. */
  readonly betweenResultsVarianceM4: number;
  readonly randomEffectsMeanM2: number;
  readonly randomEffectsStandardErrorM2: number;
}

function ofOne(figure: KeyedFigure): Combination {
  const u = standardUncertainty(figure.budget);
  return {
    figure,
    weights: [1],
    unsharedStandardUncertaintyM2: [u],
    sharedKeys: [],
    internalStandardUncertaintyM2: u,
    chiSquared: 0,
    birgeRatio: null,
    betweenResultsVarianceM4: 0,
    randomEffectsMeanM2: figure.dragAreaM2,
    randomEffectsStandardErrorM2: u,
  };
}

/**
 * The weighted mean of one or more figures. Weights are 1/u² of each one's own part; all amounts add by key with those weights, so what is
 * common survives whole. A Birge ratio R above 1 (Birge, Phys. Rev. 40 (1932) 207) adds (R² − 1)·Σw²u² under `combination:<variant>` with
 * n − 1 degrees of freedom.
 *
 * @throws {Refused} nothing-to-combine (no figure), uncertainty-zero (an own part of 0 among several)
 */
export function combine(figures: readonly KeyedFigure[], variantId: string, where = 'results'): Combination {
  const [first, ...others] = figures;
  if (first === undefined) refuse('nothing-to-combine', where, 'There is no result to combine.');
  if (others.length === 0) return ofOne(first);
  const { sharedKeys, ownUncertaintyM2 } = ownPartsOf(figures);
  const exact = ownUncertaintyM2.indexOf(0);
  if (exact >= 0) {
    refuse(
      'uncertainty-zero',
      `${where}.${exact}`,
      'A result without an uncertainty of its own would take all the weight.',
    );
  }
  const values = figures.map(({ dragAreaM2 }) => dragAreaM2);
  const { weights: unnormed, mean, chiSquared } = weightedMean(values, ownUncertaintyM2);
  const total = sum(unnormed);
  const weights = unnormed.map((w) => w / total);
  const internal = 1 / Math.sqrt(total);
  const nu = figures.length - 1;
  const birgeRatio = Math.sqrt(chiSquared / nu);
  const widening = birgeRatio > 1 ? internal * Math.sqrt(birgeRatio * birgeRatio - 1) : 0;
  const between = randomEffects(values, ownUncertaintyM2);
  return {
    figure: {
      dragAreaM2: mean,
      budget: budgetOf([
        ...figures.flatMap(({ budget }, i) => scaled(budget, weights[i] ?? 0)),
        amount(`combination:${variantId}`, widening, nu),
      ]),
    },
    weights,
    unsharedStandardUncertaintyM2: ownUncertaintyM2,
    sharedKeys,
    internalStandardUncertaintyM2: internal,
    chiSquared,
    birgeRatio,
    betweenResultsVarianceM4: between.betweenResultsVariance,
    randomEffectsMeanM2: between.mean,
    randomEffectsStandardErrorM2: between.standardError,
  };
}
