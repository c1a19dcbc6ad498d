import type * as z from 'zod';
import type { policiesChange, PolicyValues, PolicyVersion } from '#shared/contracts/policies';
import { policyValues } from '#shared/contracts/policies';
import { DEFAULT_LIMITS, DEFAULT_LIMITS_NUMBER } from '#shared/core/checks/limits';
import type { Tx } from '../../db/pools';
import type { Work } from '../../http/context';
import { fail } from '../../http/problem-error';
import { refuseUnusable } from '../../rules/refusals';
import { differences, recordAudit } from '../audit';
import { policyIssues } from './policies.policy';
import { appendVersion, listVersions, newestValues } from './policies.repository';

type PolicyChange = z.output<(typeof policiesChange)['body']>;

/** What holds before anybody has changed a limit. */
const initial = (): PolicyVersion => ({
  number: DEFAULT_LIMITS_NUMBER,
  values: policyValues.parse(DEFAULT_LIMITS),
});

/** Every version, newest first; the last is the one that the product comes with. */
export async function allVersions(work: Work): Promise<readonly PolicyVersion[]> {
  return [...(await listVersions(work.tx)), initial()];
}

/** The limits that results are checked and ranked with now, and their number (0 before the first change). */
export async function policiesInForce(
  tx: Tx,
): Promise<{ readonly number: number; readonly values: PolicyValues }> {
  return (await newestValues(tx)) ?? initial();
}

/** Writes a further version. What was computed with an earlier one keeps naming that. */
export async function changePolicies(
  work: Work,
  { expectedNumber, values, comment }: PolicyChange,
): Promise<PolicyVersion> {
  const before = await policiesInForce(work.tx);
  if (before.number !== expectedNumber) fail('conflict', { currentVersion: before.number });
  refuseUnusable(policyIssues(values));
  const changes = differences(before.values, values);
  if (changes.length === 0) {
    fail('unusable-input', {
      where: 'values',
      detail: 'Every limit is as it was. Change one, or leave the version as it is.',
      reason: 'nothing-changed',
    });
  }
  const written = await appendVersion(work, { number: before.number + 1, values, comment });
  if (written === undefined) fail('conflict', { currentVersion: before.number + 1 });
  await recordAudit(work, {
    action: 'policies.changed',
    entityKind: 'policies',
    entityId: written.id,
    summary: [{ field: 'number', before: before.number, after: written.version.number }, ...changes],
  });
  return written.version;
}
