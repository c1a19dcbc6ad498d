import type { Result } from '#shared/contracts/results';
import type { Work } from '../../http/context';
import { recordAudit } from '../audit';
import { leaveAdoptions, lockVariants } from './adoptions.service';
import { namedResults, refuseStates } from './named-results';
import { checkIssues, withdrawalIssues } from './states.policy';
import { insertStates } from './states.repository';
import { insertWithdrawals } from './withdrawals.repository';

/** The results of a list, which nobody else judges, adopts or withdraws until the transaction ends. */
export async function heldResults(
  work: Work,
  programmeId: string,
  ids: readonly string[],
): Promise<readonly Result[]> {
  const known = await namedResults(work, programmeId, ids);
  await lockVariants(
    work,
    programmeId,
    known.map(({ variantId }) => variantId),
  );
  return namedResults(work, programmeId, ids);
}

/** Says that results have been checked, or takes that back: all of them or none. */
export async function checkResults(
  work: Work,
  programmeId: string,
  ids: readonly string[],
  state: 'entered' | 'checked',
  comment: string,
): Promise<readonly Result[]> {
  const results = await heldResults(work, programmeId, ids);
  refuseStates(checkIssues(results, state));
  await insertStates(work, ids, state, comment);
  for (const { id } of results) {
    await recordAudit(work, {
      action: state === 'checked' ? 'result.checked' : 'result.check-taken-back',
      entityKind: 'result',
      entityId: id,
      summary: [{ field: 'comment', after: comment }],
    });
  }
  return namedResults(work, programmeId, ids);
}

/**
 * Withdrawn results stay readable and count for nothing; all of them or none. A variant that rested on one goes on with
 * those of its adopted results that are left, and with none left on its newest.
 */
export async function withdrawResults(
  work: Work,
  programmeId: string,
  ids: readonly string[],
  reason: string,
): Promise<readonly Result[]> {
  const results = await heldResults(work, programmeId, ids);
  refuseStates(withdrawalIssues(results));
  await insertWithdrawals(work, ids, reason);
  for (const { id, adopted } of results) {
    await recordAudit(work, {
      action: 'result.withdrawn',
      entityKind: 'result',
      entityId: id,
      summary: [
        { field: 'reason', after: reason },
        { field: 'adopted', before: adopted, after: false },
      ],
    });
  }
  await leaveAdoptions(work, programmeId, results, `was withdrawn: ${reason}`);
  return namedResults(work, programmeId, ids);
}
