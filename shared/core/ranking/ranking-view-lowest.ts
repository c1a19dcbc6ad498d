import { amount, type KeyedFigure } from '../uncertainty/budget';
import { comparablesOf } from './comparables';
import { lowestSamplingInputOf, type LowestSamplingInput } from './lowest-sampling';
import type { RankingView, ViewRow } from './ranking-view';

/** Seed of the screen's draws; that of the operation `rank` where none is given. */
export const LOWEST_SEED = 1;

/** A row's figure with its amounts by key, as the calculations hold it. */
export function keyedFigureOfRow({ figure, contributions }: ViewRow): KeyedFigure {
  return {
    dragAreaM2: figure.dragAreaM2,
    budget: contributions.map(({ key, amountM2, degreesOfFreedom, varianceEstimate }) =>
      amount(key, amountM2, degreesOfFreedom, varianceEstimate),
    ),
  };
}

/** What P(lowest) is sampled from, by drag area whatever the order shown. */
export function lowestInputOfView({ rows }: Pick<RankingView, 'rows'>): LowestSamplingInput {
  const ordered = rows.toSorted((a, b) => a.rankByDragArea - b.rankByDragArea);
  const set = comparablesOf(
    ordered.map((row) => {
      const { dragAreaM2, budget } = keyedFigureOfRow(row);
      return { id: row.variantId, value: dragAreaM2, budget, rate: 1 };
    }),
  );
  return lowestSamplingInputOf(set, LOWEST_SEED);
}
