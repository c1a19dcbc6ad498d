import type { ContextReason, RankingContext } from '#shared/core/ranking/ranking-context';
import type { AdoptionRow, JudgementRow, ResultRow } from './rankings.repository';

/** What people decided about a programme's results. */
export interface DecisionRows {
  readonly results: readonly Pick<ResultRow, 'id'>[];
  readonly adoptions: readonly AdoptionRow[];
  readonly judgements: readonly JudgementRow[];
}

type Decisions = Pick<RankingContext, 'adoptions' | 'setAside' | 'included'>;

/** Adoptions that stand and reasons that hold, of results that count still: a withdrawn one is named nowhere. */
export function decisionsOf({ results, adoptions, judgements }: DecisionRows): Decisions {
  const counting = new Set(results.map(({ id }) => id));
  const reasons = (kind: 'includedReason' | 'setAsideReason'): readonly ContextReason[] =>
    judgements.flatMap(({ resultId, at, by, ...held }): readonly ContextReason[] => {
      const reason = held[kind];
      return reason === null || !counting.has(resultId)
        ? []
        : [{ resultId, reason, at: at.toISOString(), by }];
    });
  return {
    adoptions: adoptions.flatMap(({ at, ...adoption }) => {
      const resultIds = adoption.resultIds.filter((id) => counting.has(id));
      return resultIds.length === 0 ? [] : [{ ...adoption, resultIds, at: at.toISOString() }];
    }),
    setAside: reasons('setAsideReason'),
    included: reasons('includedReason'),
  };
}
