import { fail } from '../http/problem-error';
import type { Issue } from './issue';

/** Stops with all that is wrong, where anything is. @throws {ProblemError} unusable-input */
export function refuseUnusable(issues: readonly Issue[]): void {
  const [first] = issues;
  if (first !== undefined) fail('unusable-input', { ...first, issues: [...issues] });
}

/** Stops where somebody else changed it meanwhile. @throws {ProblemError} conflict, with the version that stands */
export function demandVersion(row: { readonly version: number }, expectedVersion: number): void {
  if (row.version !== expectedVersion) fail('conflict', { currentVersion: row.version });
}

/** Stops where another one has the name already. @throws {ProblemError} already-exists */
export function demandFreeName(ownerId: string | undefined, ownId: string | undefined, name: string): void {
  if (ownerId !== undefined && ownerId !== ownId) {
    fail('already-exists', {
      where: 'name',
      detail: `“${name}” is taken, and capital letters make no difference. Choose another name.`,
    });
  }
}

/** The row, or the answer that an unknown id and a foreign one get alike. @throws {ProblemError} not-found */
export function demandFound<Row>(row: Row | undefined): Row {
  return row ?? fail('not-found');
}
