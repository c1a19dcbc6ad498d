import type { RankingInput } from '#shared/core/ranking/ranking-input';
import { reduceResults, type RefusedResult } from '#shared/core/reduction/reduce';
import type { Reduction, ReductionContext } from '#shared/core/reduction/reduction';
import { Refused, type Refusal } from '#shared/core/refusal';

/** All results at the programme's reference: the same functions that the ranking uses. */
export interface ReducedEvidence {
  readonly context: ReductionContext | null;
  readonly reductions: ReadonlyMap<string, Reduction>;
  readonly refused: ReadonlyMap<string, RefusedResult>;
  /** What refuses the whole set, for example the programme's own air. */
  readonly refusal: Refusal | null;
}

export const NOTHING_REDUCED: ReducedEvidence = {
  context: null,
  reductions: new Map(),
  refused: new Map(),
  refusal: null,
};

export function reducedEvidence(inputs: RankingInput | null): ReducedEvidence {
  if (inputs === null) return NOTHING_REDUCED;
  try {
    const { context, reductions, refused } = reduceResults(inputs);
    return {
      context,
      reductions: new Map(reductions.map((reduction) => [reduction.output.resultId, reduction])),
      refused: new Map(refused.map((each) => [each.resultId, each])),
      refusal: null,
    };
  } catch (error) {
    if (!(error instanceof Refused)) throw error;
    return { ...NOTHING_REDUCED, refusal: error };
  }
}
