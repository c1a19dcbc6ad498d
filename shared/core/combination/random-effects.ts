/** A mean that allows for a variance between the results besides their own. */
export interface RandomEffects {
  /** τ² of DerSimonian and Laird, in the square of the values' unit. */
  readonly betweenResultsVariance: number;
  readonly mean: number;
  readonly standardError: number;
}

/** Sum of a list. */
export const sum = (list: readonly number[]): number => list.reduce((total, value) => total + value, 0);

/** Weights 1/u², not normed, and their mean with χ² about it. */
export interface WeightedMean {
  readonly weights: readonly number[];
  readonly mean: number;
  /** Σ (x − mean)²/u² */
  readonly chiSquared: number;
}

/** The mean of values weighted by 1/u²; every u above 0. */
export function weightedMean(values: readonly number[], uncertainties: readonly number[]): WeightedMean {
  const weights = uncertainties.map((u) => 1 / (u * u));
  const mean = sum(values.map((x, i) => x * (weights[i] ?? 0))) / sum(weights);
  return { weights, mean, chiSquared: sum(values.map((x, i) => (weights[i] ?? 0) * (x - mean) ** 2)) };
}

/**
 * The random-effects mean of values with standard uncertainties above 0, by the moment estimate of DerSimonian and Laird (Control. Clin.
 * Trials 7 (1986) 177): τ² = max(0, (χ² − (n − 1))/(Σw − Σw²/Σw)), w = 1/u², then weights 1/(u² + τ²). For one value τ² is 0.
 */
export function randomEffects(values: readonly number[], uncertainties: readonly number[]): RandomEffects {
  const { weights, chiSquared } = weightedMean(values, uncertainties);
  const total = sum(weights);
  const excess = chiSquared - (values.length - 1);
  const divisor = total - sum(weights.map((w) => w * w)) / total;
  const betweenResultsVariance = values.length > 1 && excess > 0 ? excess / divisor : 0;
  const wider = weightedMean(
    values,
    uncertainties.map((u) => Math.sqrt(u * u + betweenResultsVariance)),
  );
  return { betweenResultsVariance, mean: wider.mean, standardError: 1 / Math.sqrt(sum(wider.weights)) };
}
