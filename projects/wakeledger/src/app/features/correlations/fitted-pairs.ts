import type { CorrelationPair } from '#shared/contracts/correlations';
import { COVERAGE_PROBABILITY } from '#shared/core/constants';
import { fitCorrelation, type CorrelationFit } from '#shared/core/correlation/correlation';
import { correlationInfluence, type PairInfluence } from '#shared/core/correlation/influence';
import { Refused } from '#shared/core/refusal';
import { studentQuantile } from '#shared/core/uncertainty/student';

/** A pair of the fit with what it does to it; left-out pairs have none. */
export interface FittedPair {
  readonly pair: CorrelationPair;
  /** Place in the list as it was given. */
  readonly place: number;
  readonly influence: PairInfluence;
}

export type FittedPairs =
  | { readonly kind: 'refused'; readonly code: string }
  | {
      readonly kind: 'fitted';
      readonly fit: CorrelationFit;
      readonly used: readonly FittedPair[];
      readonly leftOut: readonly CorrelationPair[];
    };

/** The line through the pairs that are not left out, or why there is none: what the server would say as well. */
export function fittedPairs(pairs: readonly CorrelationPair[]): FittedPairs {
  const used = pairs
    .map((pair, place) => ({ pair, place }))
    .filter(({ pair }) => pair.leftOutReason === undefined);
  if (used.length < 2) return { kind: 'refused', code: 'correlation-too-few-pairs' };
  if (used.some(({ pair }) => pair.uM2 === 0 || pair.referenceUM2 === 0)) {
    return { kind: 'refused', code: 'uncertainty-zero' };
  }
  if (used.every(({ pair }) => pair.dragAreaM2 === used[0]?.pair.dragAreaM2)) {
    return { kind: 'refused', code: 'correlation-no-spread' };
  }
  try {
    const figures = used.map(({ pair }) => pair);
    const fit = fitCorrelation(figures);
    const influences = correlationInfluence(figures);
    return {
      kind: 'fitted',
      fit,
      used: used.flatMap(({ pair, place }, i) => {
        const influence = influences[i];
        return influence === undefined ? [] : [{ pair, place, influence }];
      }),
      leftOut: pairs.filter(({ leftOutReason }) => leftOutReason !== undefined),
    };
  } catch (error) {
    if (!(error instanceof Refused)) throw error;
    return { kind: 'refused', code: error.code };
  }
}

/** The carried figure at x, and U of what the correlation itself adds to it: level, slope and scatter [m²]. */
export function bandAt(
  fit: CorrelationFit,
  xM2: number,
): { readonly yM2: number; readonly halfWidthM2: number } {
  const distance = xM2 - fit.centroidM2;
  const u = Math.hypot(
    fit.levelUncertaintyM2,
    fit.slopeUncertainty * distance,
    fit.betweenPairsStandardDeviationM2,
  );
  return {
    yM2: fit.referenceCentroidM2 + fit.slope * distance,
    halfWidthM2: studentQuantile(COVERAGE_PROBABILITY, fit.degreesOfFreedom) * u,
  };
}

/** Cook's distance from which a pair is worth a second look: 4/n, a usual rule of thumb (memory). */
export const noticeableDistance = (pairs: number): number => 4 / pairs;
