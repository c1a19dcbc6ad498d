import { and, desc, eq, inArray, max, sql } from 'drizzle-orm';
import type { FacilityFields, FacilityVersion } from '#shared/contracts/facilities';
import type { Work } from '../../http/context';
import type { Tx } from '../../db/pools';
import { facilities, facilityVersions } from '../../db/tables/facilities';
import { memberships } from '../../db/tables/organisations';

interface NewVersion {
  readonly number: number;
  readonly fields: FacilityFields;
  readonly comment?: string | undefined;
}

export async function appendVersion(
  { tx, userId, now }: Work,
  facilityId: string,
  { number, fields, comment }: NewVersion,
): Promise<void> {
  await tx.insert(facilityVersions).values({
    facilityId,
    number,
    fields,
    comment: comment ?? null,
    createdBy: userId,
    createdAt: now,
  });
}

/** Writes down what counted as version 1 where nothing was written yet: as the facility stood since it was added. */
export async function appendFirstVersion(
  { tx }: Work,
  facilityId: string,
  fields: FacilityFields,
): Promise<void> {
  await tx
    .insert(facilityVersions)
    .values({
      facilityId,
      number: 1,
      fields,
      createdAt: sql`(select ${facilities.createdAt} from ${facilities} where ${facilities.id} = ${facilityId})`,
    })
    .onConflictDoNothing();
}

/** Newest first; empty where the facility has not changed since before versions were kept. */
export async function listVersions(tx: Tx, facilityId: string): Promise<readonly FacilityVersion[]> {
  const rows = await tx
    .select({ version: facilityVersions, by: memberships.displayName })
    .from(facilityVersions)
    .leftJoin(
      memberships,
      and(
        eq(memberships.organisationId, facilityVersions.organisationId),
        eq(memberships.userId, facilityVersions.createdBy),
      ),
    )
    .where(eq(facilityVersions.facilityId, facilityId))
    .orderBy(desc(facilityVersions.number));
  return rows.map(({ version: { number, fields, comment, createdAt }, by }) => ({
    number,
    fields,
    at: createdAt.toISOString(),
    ...(comment === null ? {} : { comment }),
    ...(by === null ? {} : { by }),
  }));
}

/** When a facility was added: since then its version 1 stands where no version was written. */
export async function addedAt(tx: Tx, facilityId: string): Promise<Date | undefined> {
  const [row] = await tx
    .select({ at: facilities.createdAt })
    .from(facilities)
    .where(eq(facilities.id, facilityId));
  return row?.at;
}

/** Which version of each facility stands; one that was never written down stands at 1. */
export async function currentVersions(
  tx: Tx,
  facilityIds: readonly string[],
): Promise<readonly { readonly facilityId: string; readonly number: number }[]> {
  if (facilityIds.length === 0) return [];
  const rows = await tx
    .select({ facilityId: facilityVersions.facilityId, number: max(facilityVersions.number) })
    .from(facilityVersions)
    .where(inArray(facilityVersions.facilityId, [...facilityIds]))
    .groupBy(facilityVersions.facilityId);
  const written = new Map(rows.map(({ facilityId, number }) => [facilityId, number]));
  return [...facilityIds].sort().map((facilityId) => ({ facilityId, number: written.get(facilityId) ?? 1 }));
}
