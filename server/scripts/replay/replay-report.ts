import type { EvaluationDifference } from '#shared/core/ranking/evaluation-difference';
import type { ReplayOutcome, ReplaySummary } from './replay-evaluations';

const shown = (value: EvaluationDifference['stored']): string => (value === null ? 'nothing' : String(value));

function differenceAsText({ field, stored, now, difference }: EvaluationDifference): string {
  const by = difference === null ? '' : `, ${difference > 0 ? '+' : ''}${difference.toExponential(3)}`;
  return `${field}: stored ${shown(stored)}, now ${shown(now)}${by}`;
}

/** One line for each field that is not what it was, and one for a refusal. */
export function differencesAsText(outcome: ReplayOutcome): readonly string[] {
  const { organisation, programme, variant, results, storedAt, differences, refusal } = outcome;
  const whose = `${organisation}, ${programme}, ${variant} (${results.join(', ')}; stored ${storedAt.slice(0, 10)})`;
  return [
    ...(refusal === undefined ? [] : [`${whose}: refused now: ${refusal}`]),
    ...differences.map((difference) => `${whose}: ${differenceAsText(difference)}`),
  ];
}

export function summaryAsText({ evaluations, moved }: ReplaySummary): string {
  if (evaluations === 0) return 'No evaluation is stored yet.';
  return moved === 0
    ? `${String(evaluations)} stored evaluations computed again: all come to the same, to 1e-12.`
    : `${String(evaluations)} stored evaluations computed again: ${String(moved)} come to something else.`;
}
