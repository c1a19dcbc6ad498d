import { and, asc, eq, inArray } from 'drizzle-orm';
import type {
  CorrelationAdoption,
  CorrelationPair,
  CorrelationReplaces,
} from '#shared/contracts/correlations';
import type { Work } from '../../http/context';
import type { Tx } from '../../db/pools';
import { correlationAdoptions, correlations, correlationVersions } from '../../db/tables/judgement';
import { memberships } from '../../db/tables/organisations';

/** What was said of the use of a correlation. */
export interface UseRow extends CorrelationAdoption {
  readonly versionId?: string;
}

/** What was said of the use of each correlation, in the order in which it was said. */
export async function useByCorrelation(
  tx: Tx,
  correlationIds?: readonly string[],
): Promise<ReadonlyMap<string, readonly UseRow[]>> {
  const rows = await tx
    .select({
      adoption: correlationAdoptions,
      number: correlationVersions.number,
      by: memberships.displayName,
    })
    .from(correlationAdoptions)
    .leftJoin(
      correlationVersions,
      and(
        eq(correlationVersions.organisationId, correlationAdoptions.organisationId),
        eq(correlationVersions.id, correlationAdoptions.versionId),
      ),
    )
    .innerJoin(
      memberships,
      and(
        eq(memberships.organisationId, correlationAdoptions.organisationId),
        eq(memberships.userId, correlationAdoptions.adoptedBy),
      ),
    )
    .where(
      correlationIds === undefined
        ? undefined
        : inArray(correlationAdoptions.correlationId, [...correlationIds]),
    )
    .orderBy(asc(correlationAdoptions.adoptedAt), asc(correlationAdoptions.id));
  const use = new Map<string, UseRow[]>();
  for (const { adoption, number, by } of rows) {
    const said = use.get(adoption.correlationId) ?? [];
    use.set(adoption.correlationId, said);
    said.push({
      ...(adoption.versionId === null ? {} : { versionId: adoption.versionId }),
      ...(number === null ? {} : { versionNumber: number }),
      effectiveDate: adoption.effectiveDate,
      comment: adoption.comment,
      at: adoption.adoptedAt.toISOString(),
      by,
    });
  }
  return use;
}

/** What was said of the use of one correlation. */
export async function listUse(tx: Tx, correlationId: string): Promise<readonly UseRow[]> {
  return (await useByCorrelation(tx, [correlationId])).get(correlationId) ?? [];
}

export async function insertUse(
  { tx, userId }: Work,
  correlationId: string,
  word: { readonly versionId: string | null; readonly effectiveDate: string; readonly comment: string },
): Promise<void> {
  await tx.insert(correlationAdoptions).values({ correlationId, ...word, adoptedBy: userId });
}

export interface VersionRow {
  readonly id: string;
  readonly name: string;
  readonly facilityId: string;
  readonly referenceFacilityId: string;
  readonly replaces: readonly CorrelationReplaces[];
  readonly pairs: readonly CorrelationPair[];
}

/** Versions by their ids, with what their correlation is called and joins. */
export async function versionsById(tx: Tx, ids: readonly string[]): Promise<readonly VersionRow[]> {
  if (ids.length === 0) return [];
  return tx
    .select({
      id: correlationVersions.id,
      name: correlations.name,
      facilityId: correlations.facilityId,
      referenceFacilityId: correlations.referenceFacilityId,
      replaces: correlationVersions.replaces,
      pairs: correlationVersions.pairs,
    })
    .from(correlationVersions)
    .innerJoin(
      correlations,
      and(
        eq(correlations.organisationId, correlationVersions.organisationId),
        eq(correlations.id, correlationVersions.correlationId),
      ),
    )
    .where(inArray(correlationVersions.id, [...ids]));
}
