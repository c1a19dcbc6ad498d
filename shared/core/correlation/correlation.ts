import { CORRELATION_LINE_PAIRS } from '../constants';
import type { CorrelationPairInput } from '../ranking/ranking-input';
import { refuse } from '../refusal';
import { amount, type Amount } from '../uncertainty/budget';

/**
 * CdA_ref = a + b·CdA by weighted least squares over pairs of one geometry, w = 1/(u_x² + u_y²), about the centroid, so that
 * level and slope are uncorrelated. Under five pairs b = 1 and only the offset is fitted. Areas in m² at full scale.
 */
export interface CorrelationFit {
  readonly pairs: readonly CorrelationPairInput[];
  readonly weights: readonly number[];
  readonly offsetOnly: boolean;
  /** b, dimensionless. */
  readonly slope: number;
  /** a. */
  readonly interceptM2: number;
  /** Weighted means x̄ and ȳ. */
  readonly centroidM2: number;
  readonly referenceCentroidM2: number;
  /** 1/√Σw, widened [m²]. */
  readonly levelUncertaintyM2: number;
  /** 1/√Σw(x − x̄)², widened, dimensionless; 0 for an offset. */
  readonly slopeUncertainty: number;
  /** The DerSimonian–Laird standard deviation of the residuals that the pairs' own u do not explain [m²]. */
  readonly betweenPairsStandardDeviationM2: number;
  /** Σw·(residual)². */
  readonly chiSquared: number;
  /** max(1, √(χ²/(n − p))). */
  readonly wideningFactor: number;
  /** ν = n − p; infinite where n = p. */
  readonly degreesOfFreedom: number;
  /** Least and greatest x: no figure outside is correlated. */
  readonly validFromM2: number;
  readonly validToM2: number;
}

const sum = (list: readonly number[]): number => list.reduce((total, value) => total + value, 0);

function weightsOf(pairs: readonly CorrelationPairInput[], where: string): number[] {
  return pairs.map(({ uM2, referenceUM2 }, i) => {
    const variance = uM2 * uM2 + referenceUM2 * referenceUM2;
    if (!(variance > 0)) {
      refuse('uncertainty-zero', `${where}.${i}`, 'A pair without any uncertainty cannot be weighed.');
    }
    return 1 / variance;
  });
}

/**
 * Variance between pairs beyond their own u (DerSimonian and Laird, Control. Clin. Trials 7 (1986) 177, for the residuals of a
 * fit): the expectation of χ² is n − p + τ²·(Σw − Σw²/Σw − Σw²(x − x̄)²/Σw(x − x̄)²), the last term for a line only.
 */
function betweenPairsVariance(
  chiSquared: number,
  degreesOfFreedom: number,
  weights: readonly number[],
  distances: readonly number[] | null,
): number {
  const total = sum(weights);
  let information = total - sum(weights.map((w) => w * w)) / total;
  if (distances !== null) {
    const squares = sum(weights.map((w, i) => w * (distances[i] ?? NaN) ** 2));
    information -= sum(weights.map((w, i) => (w * (distances[i] ?? NaN)) ** 2)) / squares;
  }
  return Math.max(0, (chiSquared - degreesOfFreedom) / information);
}

/**
 * Fits a correlation.
 *
 * @throws {Refused} correlation-too-few-pairs (none), uncertainty-zero, correlation-no-spread, correlation-negative-slope (b ≤ 0)
 */
export function fitCorrelation(pairs: readonly CorrelationPairInput[], where = 'pairs'): CorrelationFit {
  const n = pairs.length;
  if (n === 0) refuse('correlation-too-few-pairs', where, 'A correlation needs at least one pair.');
  const weights = weightsOf(pairs, where);
  const x = pairs.map((pair) => pair.dragAreaM2);
  const y = pairs.map((pair) => pair.referenceDragAreaM2);
  const validFromM2 = Math.min(...x);
  const validToM2 = Math.max(...x);
  const offsetOnly = n < CORRELATION_LINE_PAIRS;
  if (!offsetOnly && validFromM2 === validToM2) {
    refuse('correlation-no-spread', where, 'All pairs have the same drag area: there is no slope in them.');
  }
  const total = sum(weights);
  // From the first value on, so that equal values have exactly themselves as their mean and no slope from rounding.
  const weightedMean = (values: readonly number[]): number => {
    const first = values[0] ?? NaN;
    return first + sum(values.map((value, i) => (weights[i] ?? NaN) * (value - first))) / total;
  };
  const centroidM2 = weightedMean(x);
  const referenceCentroidM2 = weightedMean(y);
  const distances = x.map((value) => value - centroidM2);
  const squares = sum(distances.map((distance, i) => (weights[i] ?? NaN) * distance * distance));
  const products = sum(
    distances.map((distance, i) => (weights[i] ?? NaN) * distance * ((y[i] ?? NaN) - referenceCentroidM2)),
  );
  const slope = offsetOnly ? 1 : products / squares;
  if (!(slope > 0)) {
    refuse(
      'correlation-negative-slope',
      where,
      `The slope is ${slope.toPrecision(3)}: more drag in one facility would be less in the other.`,
    );
  }
  const chiSquared = sum(
    distances.map(
      (distance, i) => (weights[i] ?? NaN) * ((y[i] ?? NaN) - referenceCentroidM2 - slope * distance) ** 2,
    ),
  );
  const spare = n - (offsetOnly ? 1 : 2);
  const wideningFactor = spare > 0 ? Math.max(1, Math.sqrt(chiSquared / spare)) : 1;
  return {
    pairs,
    weights,
    offsetOnly,
    slope,
    interceptM2: referenceCentroidM2 - slope * centroidM2,
    centroidM2,
    referenceCentroidM2,
    levelUncertaintyM2: wideningFactor / Math.sqrt(total),
    slopeUncertainty: offsetOnly ? 0 : wideningFactor / Math.sqrt(squares),
    betweenPairsStandardDeviationM2:
      spare > 0
        ? Math.sqrt(betweenPairsVariance(chiSquared, spare, weights, offsetOnly ? null : distances))
        : 0,
    chiSquared,
    wideningFactor,
    degreesOfFreedom: spare > 0 ? spare : Infinity,
    validFromM2,
    validToM2,
  };
}

/** As many digits as tell it from the range's end: `0.5624`. */
const inWords = (dragAreaM2: number): string => dragAreaM2.toPrecision(4);

/**
 * A drag area [m²] carried to the reference facility: ȳ + b·(x − x̄).
 *
 * @throws {Refused} correlation-range outside [x_min, x_max] of the pairs
 */
export function correlatedDragArea(fit: CorrelationFit, dragAreaM2: number, correlationId: string): number {
  if (!(dragAreaM2 >= fit.validFromM2 && dragAreaM2 <= fit.validToM2)) {
    refuse(
      'correlation-range',
      `correlation:${correlationId}`,
      `A drag area of ${inWords(dragAreaM2)} m² lies outside what its pairs cover, ${inWords(fit.validFromM2)} to ${inWords(fit.validToM2)} m². A pair beyond it would widen the range.`,
    );
  }
  return fit.referenceCentroidM2 + fit.slope * (dragAreaM2 - fit.centroidM2);
}

/**
 * What the correlation itself adds [m²]: its level, its slope at this drag area (signed), and the scatter between geometries,
 * which belongs to the variant; all of one variance estimate.
 */
export function correlationAmounts(
  fit: CorrelationFit,
  dragAreaM2: number,
  correlationId: string,
  variantId: string,
): Amount[] {
  const { degreesOfFreedom } = fit;
  const estimate = `correlation:${correlationId}`;
  return [
    amount(`correlation-level:${correlationId}`, fit.levelUncertaintyM2, degreesOfFreedom, estimate),
    amount(
      `correlation-slope:${correlationId}`,
      fit.slopeUncertainty * (dragAreaM2 - fit.centroidM2),
      degreesOfFreedom,
      estimate,
    ),
    amount(
      `correlation-scatter:${correlationId}:${variantId}`,
      fit.betweenPairsStandardDeviationM2,
      degreesOfFreedom,
      estimate,
    ),
  ];
}
