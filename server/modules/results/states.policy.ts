import type { Result } from '#shared/contracts/results';
import type { Issue } from '../../rules/issue';

type Known = Pick<Result, 'name' | 'state' | 'withdrawn'>;

/** What happened to it before is never undone: a withdrawn result stays withdrawn. */
function withdrawnRefusal({ name, withdrawn }: Known): string | undefined {
  return withdrawn && `${name} was withdrawn already, by ${withdrawn.by}.`;
}

function checkRefusal(result: Known, wanted: 'entered' | 'checked'): string | undefined {
  const { name, state } = result;
  const withdrawn = withdrawnRefusal(result);
  if (withdrawn !== undefined) return withdrawn;
  if (wanted === 'checked') {
    return state === 'entered' ? undefined : `${name} has been checked already.`;
  }
  if (state === 'entered') return `${name} has not been checked, so there is nothing to take back.`;
  return state === 'adopted'
    ? `${name} is adopted. Adopt other results or release it, then take the check back.`
    : undefined;
}

const issuesOf = (
  results: readonly Known[],
  refusalOf: (result: Known) => string | undefined,
): readonly Issue[] =>
  results.flatMap((result, position): readonly Issue[] => {
    const detail = refusalOf(result);
    return detail === undefined ? [] : [{ where: `resultIds.${position}`, detail }];
  });

/** Each result of a list that cannot be called checked, or not checked any more, and why. */
export function checkIssues(results: readonly Known[], wanted: 'entered' | 'checked'): readonly Issue[] {
  return issuesOf(results, (result) => checkRefusal(result, wanted));
}

/** Each result of a list that cannot be withdrawn, and why. */
export function withdrawalIssues(results: readonly Known[]): readonly Issue[] {
  return issuesOf(results, withdrawnRefusal);
}
