import type { RankingView, ViewRow } from '#shared/core/ranking/ranking-view';
import { keyedFigureOfRow } from '#shared/core/ranking/ranking-view-lowest';
import { differenceOf, figureOf, probabilityLower } from '#shared/core/uncertainty/budget';

/** One variant against another one: what a person asks who doubts an order. */
export interface PairRow {
  readonly variantId: string;
  readonly name: string;
  readonly rank: number;
  /** The other's drag area minus that of the chosen one [m²]. */
  readonly differenceM2: number;
  /** Of the difference: what both hold under one key has cancelled. */
  readonly expandedUncertaintyM2: number;
  /** That the chosen one has the lower drag area. */
  readonly probabilityLower: number;
  readonly separable: boolean;
}

/** The chosen variant against every other, in the order that is shown; by drag area, whatever the order goes by. */
export function pairRows(
  { rows, confidence }: Pick<RankingView, 'rows' | 'confidence'>,
  chosen: ViewRow,
): readonly PairRow[] {
  const own = keyedFigureOfRow(chosen);
  return rows
    .filter(({ variantId }) => variantId !== chosen.variantId)
    .map((row) => {
      const other = keyedFigureOfRow(row);
      const { dragAreaM2, expandedUncertaintyM2 } = figureOf(differenceOf(other, own));
      const probability = probabilityLower(own, other);
      return {
        variantId: row.variantId,
        name: row.name,
        rank: row.rank,
        differenceM2: dragAreaM2,
        expandedUncertaintyM2,
        probabilityLower: probability,
        separable: Math.max(probability, 1 - probability) >= confidence,
      };
    });
}
