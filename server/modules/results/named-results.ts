import type { Result } from '#shared/contracts/results';
import type { Work } from '../../http/context';
import { fail } from '../../http/problem-error';
import type { Issue } from '../../rules/issue';
import { findResults } from './results.repository';

/**
 * The results of a list, in its order. @throws {ProblemError} not-found where one is not in the programme;
 * unusable-input where one stands twice
 */
export async function namedResults(
  work: Work,
  programmeId: string,
  ids: readonly string[],
): Promise<readonly Result[]> {
  const found = new Map((await findResults(work.tx, programmeId, ids)).map((result) => [result.id, result]));
  const named = ids.flatMap((id) => found.get(id) ?? []);
  if (named.length < ids.length) fail('not-found');
  const again = ids.findIndex((id, position) => ids.indexOf(id) !== position);
  if (again >= 0) {
    fail('unusable-input', {
      where: String(again),
      detail: `${named[again]?.name ?? ''} stands twice in the list. Name each result once.`,
    });
  }
  return named;
}

/** Stops with every refusal, where there are any. @throws {ProblemError} wrong-state */
export function refuseStates(issues: readonly Issue[]): void {
  const [first] = issues;
  if (first !== undefined) fail('wrong-state', { ...first, issues: [...issues] });
}
