import type { AdoptionOrder } from '#shared/contracts/adoptions';
import { DEFAULT_CHOICES } from '#shared/core/ranking/ranking-choices';
import { compareRankings, type RankingComparison } from '#shared/core/ranking/ranking-comparison';
import type { RankingContext } from '#shared/core/ranking/ranking-context';
import type { RankingInput } from '#shared/core/ranking/ranking-input';
import type { RankedCombination } from '#shared/core/ranking/ranking-output';
import type { RankingView } from '#shared/core/ranking/ranking-view';
import { buildRankingView, reducedForChoices } from '#shared/core/ranking/ranking-view-build';
import type { ReducedSet } from '#shared/core/reduction/reduce';
import { Refused, type Refusal } from '#shared/core/refusal';

export interface AdoptionPreview {
  readonly comparison: RankingComparison;
  /** How the results of a weighted mean agree, by variant. */
  readonly combinations: ReadonlyMap<string, RankedCombination>;
}

/** A context in which the orders have been carried out already. */
function contextWith(
  context: RankingContext,
  orders: readonly Pick<AdoptionOrder, 'variantId' | 'resultIds' | 'rule'>[],
): RankingContext {
  const ordered = new Set(orders.map(({ variantId }) => variantId));
  return {
    ...context,
    adoptions: [
      ...context.adoptions.filter(({ variantId }) => !ordered.has(variantId)),
      ...orders
        .filter(({ resultIds }) => resultIds.length > 0)
        .map(({ variantId, resultIds, rule }) => ({ id: '', variantId, resultIds, rule, at: '', by: '' })),
    ],
  };
}

/** A ranking with the results at the reference that it is made from: they stay, whatever is adopted. */
export interface AdoptedRanking {
  readonly view: RankingView;
  readonly reduced: ReducedSet;
}

/** The ranking by drag area on adopted evidence, as everybody sees it. @throws {Refused} what refuses the whole ranking */
export function adoptedRanking(inputs: RankingInput, context: RankingContext): AdoptedRanking {
  const reduced = reducedForChoices(inputs, DEFAULT_CHOICES);
  return { view: buildRankingView(inputs, context, DEFAULT_CHOICES, reduced), reduced };
}

/** What the ranking would be with the orders carried out, beside what it is; the reason where the method refuses them. */
export function previewAdoption(
  inputs: RankingInput,
  context: RankingContext,
  before: AdoptedRanking,
  orders: readonly Pick<AdoptionOrder, 'variantId' | 'resultIds' | 'rule'>[],
): AdoptionPreview | Refusal {
  try {
    const after = buildRankingView(inputs, contextWith(context, orders), DEFAULT_CHOICES, before.reduced);
    return {
      comparison: compareRankings(before.view, after),
      combinations: new Map(
        after.rows.flatMap(({ variantId, combination }) =>
          combination === null ? [] : [[variantId, combination] as const],
        ),
      ),
    };
  } catch (error) {
    if (!(error instanceof Refused)) throw error;
    return error;
  }
}
