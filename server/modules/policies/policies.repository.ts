import { and, desc, eq, type SQL } from 'drizzle-orm';
import type { PolicyValues, PolicyVersion } from '#shared/contracts/policies';
import type { Tx } from '../../db/pools';
import { policyVersions } from '../../db/tables/judgement';
import { memberships } from '../../db/tables/organisations';
import type { Work } from '../../http/context';

async function versionsWhere(tx: Tx, condition: SQL | undefined): Promise<readonly PolicyVersion[]> {
  const rows = await tx
    .select({
      number: policyVersions.number,
      values: policyVersions.values,
      comment: policyVersions.comment,
      at: policyVersions.createdAt,
      by: memberships.displayName,
    })
    .from(policyVersions)
    .innerJoin(
      memberships,
      and(
        eq(memberships.organisationId, policyVersions.organisationId),
        eq(memberships.userId, policyVersions.createdBy),
      ),
    )
    .where(condition)
    .orderBy(desc(policyVersions.number));
  return rows.map(({ at, ...version }) => ({ ...version, at: at.toISOString() }));
}

/** Newest first; none where nobody has changed a limit yet. */
export async function listVersions(tx: Tx): Promise<readonly PolicyVersion[]> {
  return versionsWhere(tx, undefined);
}

/** The values in force and their number, without who and why; undefined where nobody has changed a limit yet. */
export async function newestValues(
  tx: Tx,
): Promise<{ readonly number: number; readonly values: PolicyValues } | undefined> {
  const [row] = await tx
    .select({ number: policyVersions.number, values: policyVersions.values })
    .from(policyVersions)
    .orderBy(desc(policyVersions.number))
    .limit(1);
  return row;
}

/** The version that was written; undefined where somebody else has taken the number meanwhile. */
export async function appendVersion(
  { tx, userId, now }: Work,
  version: { readonly number: number; readonly values: PolicyValues; readonly comment: string },
): Promise<{ readonly id: string; readonly version: PolicyVersion } | undefined> {
  const [row] = await tx
    .insert(policyVersions)
    .values({ ...version, createdBy: userId, createdAt: now })
    .onConflictDoNothing()
    .returning({ id: policyVersions.id });
  if (row === undefined) return undefined;
  const [written] = await versionsWhere(tx, eq(policyVersions.id, row.id));
  return written && { id: row.id, version: written };
}
