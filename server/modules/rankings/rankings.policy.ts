import type { RankingView } from '#shared/core/ranking/ranking-view';

/**
 * The view for those who may not see the raw evidence. It holds no measured value to begin with; only the method's own
 * words about a refused result can quote one.
 */
export function withoutRawEvidence(view: RankingView): RankingView {
  return {
    ...view,
    stayedOut: view.stayedOut.map((exclusion) => ({
      ...exclusion,
      rules: exclusion.rules.map((rule) =>
        rule.rule.startsWith('refused:') ? { ...rule, detail: null } : rule,
      ),
    })),
  };
}
