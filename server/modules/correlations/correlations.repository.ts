import { and, asc, desc, eq, inArray, max, sql } from 'drizzle-orm';
import type { CorrelationVersion, CorrelationVersionFields } from '#shared/contracts/correlations';
import type { Work } from '../../http/context';
import type { Tx } from '../../db/pools';
import { present } from '../../db/returned-row';
import { correlations, correlationVersions } from '../../db/tables/judgement';
import { memberships } from '../../db/tables/organisations';
import { results } from '../../db/tables/results';
import type { PairedResult } from './correlations.policy';

export interface CorrelationRow {
  readonly id: string;
  readonly name: string;
  readonly facilityId: string;
  readonly referenceFacilityId: string;
}

const COLUMNS = {
  id: correlations.id,
  name: correlations.name,
  facilityId: correlations.facilityId,
  referenceFacilityId: correlations.referenceFacilityId,
};

/** By name: the order in which the first that fits is used. */
export async function listCorrelations(tx: Tx): Promise<readonly CorrelationRow[]> {
  return tx
    .select(COLUMNS)
    .from(correlations)
    .orderBy(sql`lower(${correlations.name})`, asc(correlations.id));
}

export async function findCorrelation(tx: Tx, id: string): Promise<CorrelationRow | undefined> {
  const [row] = await tx.select(COLUMNS).from(correlations).where(eq(correlations.id, id));
  return row;
}

/** As `findCorrelation`, and nobody else adds a version or changes its use until the transaction ends. */
export async function lockCorrelation(tx: Tx, id: string): Promise<CorrelationRow | undefined> {
  await tx.select({ id: correlations.id }).from(correlations).where(eq(correlations.id, id)).for('update');
  return findCorrelation(tx, id);
}

/** Every correlation of one facility pair, so that no two come into use at once. */
export async function lockCorrelationsBetween(
  tx: Tx,
  { facilityId, referenceFacilityId }: CorrelationRow,
): Promise<readonly CorrelationRow[]> {
  return tx
    .select(COLUMNS)
    .from(correlations)
    .where(
      and(eq(correlations.facilityId, facilityId), eq(correlations.referenceFacilityId, referenceFacilityId)),
    )
    .orderBy(asc(correlations.id))
    .for('update');
}

export async function correlationOfName(tx: Tx, name: string): Promise<string | undefined> {
  const [row] = await tx
    .select({ id: correlations.id })
    .from(correlations)
    .where(sql`lower(${correlations.name}) = lower(${name})`);
  return row?.id;
}

export async function insertCorrelation(
  { tx, userId, now }: Work,
  { name, facilityId, referenceFacilityId }: Omit<CorrelationRow, 'id'>,
): Promise<string> {
  const [row] = await tx
    .insert(correlations)
    .values({ name, facilityId, referenceFacilityId, createdBy: userId, createdAt: now })
    .returning({ id: correlations.id });
  return present(row).id;
}

export async function insertVersion(
  { tx, userId, now }: Work,
  correlationId: string,
  number: number,
  { replaces, pairs, comment }: CorrelationVersionFields,
): Promise<void> {
  await tx.insert(correlationVersions).values({
    correlationId,
    number,
    replaces: [...replaces],
    pairs,
    comment,
    createdBy: userId,
    createdAt: now,
  });
}

/** The newest version number of each correlation. */
export async function latestNumbers(tx: Tx): Promise<ReadonlyMap<string, number>> {
  const rows = await tx
    .select({ id: correlationVersions.correlationId, number: max(correlationVersions.number) })
    .from(correlationVersions)
    .groupBy(correlationVersions.correlationId);
  return new Map(rows.map(({ id, number }) => [id, number ?? 0]));
}

/** The versions of one correlation, newest first. */
export async function listVersions(tx: Tx, correlationId: string): Promise<readonly CorrelationVersion[]> {
  const rows = await tx
    .select({ version: correlationVersions, by: memberships.displayName })
    .from(correlationVersions)
    .innerJoin(
      memberships,
      and(
        eq(memberships.organisationId, correlationVersions.organisationId),
        eq(memberships.userId, correlationVersions.createdBy),
      ),
    )
    .where(eq(correlationVersions.correlationId, correlationId))
    .orderBy(desc(correlationVersions.number));
  return rows.map(({ version: { id, number, replaces, pairs, comment, createdAt }, by }) => ({
    id,
    number,
    replaces,
    pairs: [...pairs],
    comment,
    at: createdAt.toISOString(),
    by,
  }));
}

/** Where results were measured and of which variant; ids that are not the organisation's are left out. */
export async function pairedResults(
  tx: Tx,
  ids: readonly string[],
): Promise<ReadonlyMap<string, PairedResult>> {
  if (ids.length === 0) return new Map();
  const rows = await tx
    .select({ id: results.id, variantId: results.variantId, facilityId: results.facilityId })
    .from(results)
    .where(inArray(results.id, [...ids]));
  return new Map(rows.map((row) => [row.id, row]));
}
