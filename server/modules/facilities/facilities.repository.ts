import { asc, eq, getTableColumns, inArray, sql } from 'drizzle-orm';
import type { Facility, FacilityFields } from '#shared/contracts/facilities';
import type { Tx } from '../../db/pools';
import { facilities } from '../../db/tables/facilities';
import { present } from '../../db/returned-row';
import { withNulls, withoutNulls } from '../../db/without-nulls';

const COLUMNS = [
  'name',
  'kind',
  'areaM2',
  'blockage',
  'usualCondition',
  'biasURelative',
  'biasUM2',
  'sessionURelative',
  'sessionUM2',
  'sessionDegreesOfFreedom',
  'installationURelative',
  'installationUM2',
  'installationDegreesOfFreedom',
  'repeatabilityURelative',
  'repeatabilityDegreesOfFreedom',
  'checkBody',
  'remark',
] as const satisfies readonly (keyof FacilityFields)[];

/**
 * A facility as it was entered counts as its version 1, whether or not that was written down. In plain SQL, because the
 * query builder names no table in a query of one table, and within the subquery that would be another one.
 */
const WITH_VERSION = {
  ...getTableColumns(facilities),
  versionNumber: sql<number>`coalesce((
    select max(v.number) from facility_versions v where v.facility_id = facilities.id
  ), 1)`,
};

type FacilityRow = typeof facilities.$inferSelect & { readonly versionNumber: number };

function facilityOf(row: FacilityRow): Facility {
  const { organisationId: _organisationId, createdAt: _createdAt, retiredAt, ...rest } = row;
  return { ...withoutNulls(rest), ...(retiredAt === null ? {} : { retiredAt: retiredAt.toISOString() }) };
}

export async function listFacilities(tx: Tx): Promise<readonly Facility[]> {
  const rows = await tx
    .select(WITH_VERSION)
    .from(facilities)
    .orderBy(sql`lower(${facilities.name})`, asc(facilities.id));
  return rows.map(facilityOf);
}

export async function findFacility(tx: Tx, id: string): Promise<Facility | undefined> {
  const [row] = await tx.select(WITH_VERSION).from(facilities).where(eq(facilities.id, id));
  return row && facilityOf(row);
}

/** As `findFacility`, and nobody else changes it or enters a result there until the transaction ends. */
export async function lockFacility(tx: Tx, id: string): Promise<Facility | undefined> {
  await tx.select({ id: facilities.id }).from(facilities).where(eq(facilities.id, id)).for('update');
  return findFacility(tx, id);
}

/** Which of these ids are facilities of the organisation. */
export async function knownFacilityIds(tx: Tx, ids: readonly string[]): Promise<ReadonlySet<string>> {
  if (ids.length === 0) return new Set();
  const rows = await tx
    .select({ id: facilities.id })
    .from(facilities)
    .where(inArray(facilities.id, [...ids]));
  return new Set(rows.map((row) => row.id));
}

export async function facilityOfName(tx: Tx, name: string): Promise<string | undefined> {
  const [row] = await tx
    .select({ id: facilities.id })
    .from(facilities)
    .where(sql`lower(${facilities.name}) = lower(${name})`);
  return row?.id;
}

export async function insertFacility(tx: Tx, fields: FacilityFields): Promise<string> {
  const [row] = await tx
    .insert(facilities)
    .values(withNulls(fields, COLUMNS))
    .returning({ id: facilities.id });
  return present(row).id;
}

export async function updateFacility(tx: Tx, id: string, fields: FacilityFields): Promise<void> {
  await tx
    .update(facilities)
    .set({ ...withNulls(fields, COLUMNS), version: sql`${facilities.version} + 1` })
    .where(eq(facilities.id, id));
}

export async function setFacilityRetired(tx: Tx, id: string, retiredAt: Date | null): Promise<void> {
  await tx
    .update(facilities)
    .set({ retiredAt, version: sql`${facilities.version} + 1` })
    .where(eq(facilities.id, id));
}
