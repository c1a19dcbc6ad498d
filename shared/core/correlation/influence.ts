import type { CorrelationPairInput } from '../ranking/ranking-input';
import { Refused } from '../refusal';
import { fitCorrelation, type CorrelationFit } from './correlation';

/** What one pair does to a correlation; areas in m² at full scale. */
export interface PairInfluence {
  /** y − (a + b·x). */
  readonly residualM2: number;
  /** Residual over its own standard deviation (internally studentised); null where the pair alone fixes the line. */
  readonly standardisedResidual: number | null;
  /** Share of its own figure in the value fitted to it, 0 to 1. */
  readonly leverage: number;
  /** Cook's distance; null where `standardisedResidual` is. */
  readonly cooksDistance: number | null;
  /** The correlation without this pair, or why there is none. */
  readonly without: WithoutPair | { readonly refusal: string };
}

export interface WithoutPair {
  readonly slopeChange: number;
  /** At the centroid of all pairs. */
  readonly levelChangeM2: number;
  /** Of the carried figure, where within the range of all pairs it moves most; signed. */
  readonly largestChangeM2: number;
  readonly largestChangeAtM2: number;
  /** Without it fewer than five pairs are left: an offset, and no slope. */
  readonly becomesOffset: boolean;
  readonly validFromM2: number;
  readonly validToM2: number;
}

const valueAt = (fit: CorrelationFit, xM2: number): number =>
  fit.referenceCentroidM2 + fit.slope * (xM2 - fit.centroidM2);

function withoutPair(all: CorrelationFit, place: number): PairInfluence['without'] {
  try {
    const rest = fitCorrelation(all.pairs.filter((_pair, i) => i !== place));
    const changeAt = (xM2: number): number => valueAt(rest, xM2) - valueAt(all, xM2);
    // The difference of two lines is largest at one end.
    const end =
      Math.abs(changeAt(all.validFromM2)) > Math.abs(changeAt(all.validToM2))
        ? all.validFromM2
        : all.validToM2;
    return {
      slopeChange: rest.slope - all.slope,
      levelChangeM2: changeAt(all.centroidM2),
      largestChangeM2: changeAt(end),
      largestChangeAtM2: end,
      becomesOffset: rest.offsetOnly && !all.offsetOnly,
      validFromM2: rest.validFromM2,
      validToM2: rest.validToM2,
    };
  } catch (error) {
    if (!(error instanceof Refused)) throw error;
    return { refusal: error.code };
  }
}

function leverageOf({ weights, pairs, centroidM2, offsetOnly }: CorrelationFit, place: number): number {
  const total = weights.reduce((sum, weight) => sum + weight, 0);
  const weight = weights[place] ?? NaN;
  if (offsetOnly) return weight / total;
  const squares = pairs.reduce(
    (sum, { dragAreaM2 }, i) => sum + (weights[i] ?? NaN) * (dragAreaM2 - centroidM2) ** 2,
    0,
  );
  const distance = (pairs[place]?.dragAreaM2 ?? NaN) - centroidM2;
  return weight / total + (weight * distance * distance) / squares;
}

/** Below this share of its own freedom a residual says nothing: rounding decides it. */
const NO_FREEDOM = 1e-9;

/**
 * Leave-one-out influence of every pair, in their order: residuals studentised internally and Cook's distance (Cook,
 * Technometrics 19 (1977) 15), changes when a pair is left out (Belsley, Kuh and Welsch, Regression Diagnostics (1980),
 * chapter 2), all for the weighted fit: residuals times √w. A line of five pairs without one becomes an offset, by the rule
 * of the correlation itself.
 *
 * @throws {Refused} as {@link fitCorrelation}
 */
export function correlationInfluence(pairs: readonly CorrelationPairInput[]): readonly PairInfluence[] {
  const fit = fitCorrelation(pairs);
  const parameters = fit.offsetOnly ? 1 : 2;
  const spare = pairs.length - parameters;
  const variance = spare > 0 ? fit.chiSquared / spare : 0;
  return pairs.map((pair, place) => {
    const residualM2 = pair.referenceDragAreaM2 - valueAt(fit, pair.dragAreaM2);
    const leverage = leverageOf(fit, place);
    const freedom = 1 - leverage;
    const judged = variance > 0 && freedom > NO_FREEDOM;
    const standardisedResidual = judged
      ? (residualM2 * Math.sqrt(fit.weights[place] ?? NaN)) / Math.sqrt(variance * freedom)
      : null;
    return {
      residualM2,
      standardisedResidual,
      leverage,
      cooksDistance:
        standardisedResidual === null
          ? null
          : (standardisedResidual ** 2 * leverage) / (parameters * freedom),
      without: withoutPair(fit, place),
    };
  });
}
