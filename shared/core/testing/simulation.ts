import { normalQuantile } from '../uncertainty/normal-quantile';
import { uniformNumbers } from '../uncertainty/sfc32';

/** Seeded standard normal numbers: the same seed gives the same simulation on every machine. */
export function normalNumbers(seed: number): () => number {
  const uniform = uniformNumbers(seed);
  return () => normalQuantile(uniform());
}

/** What a simulation found, with its own standard errors. */
export interface Simulated {
  readonly mean: number;
  readonly standardErrorOfMean: number;
  readonly standardDeviation: number;
  readonly standardErrorOfDeviation: number;
  readonly draws: readonly number[];
}

/** Moments of many draws; the standard error of the deviation is s·√((κ − 1)/(4n)), κ the kurtosis found. */
export function simulate(count: number, draw: () => number): Simulated {
  const draws = Array.from({ length: count }, draw);
  const mean = draws.reduce((sum, x) => sum + x, 0) / count;
  let second = 0;
  let fourth = 0;
  for (const x of draws) {
    const square = (x - mean) ** 2;
    second += square;
    fourth += square * square;
  }
  const variance = second / (count - 1);
  const standardDeviation = Math.sqrt(variance);
  const kurtosis = fourth / count / (second / count) ** 2;
  return {
    mean,
    standardErrorOfMean: standardDeviation / Math.sqrt(count),
    standardDeviation,
    standardErrorOfDeviation: standardDeviation * Math.sqrt((kurtosis - 1) / (4 * count)),
    draws,
  };
}

/** Share of a list that a test holds for. */
export function shareOf<T>(list: readonly T[], holds: (item: T) => boolean): number {
  return list.filter(holds).length / list.length;
}
