import { and, asc, eq, getTableColumns, isNull, type SQL } from 'drizzle-orm';
import { alias } from 'drizzle-orm/pg-core';
import type { CheckMeasurement, CheckMeasurementFields } from '#shared/contracts/test-sessions';
import { present } from '../../db/returned-row';
import type { Tx } from '../../db/pools';
import { checkMeasurements } from '../../db/tables/facilities';
import { memberships } from '../../db/tables/organisations';
import { withNulls, withoutNulls } from '../../db/without-nulls';
import type { Work } from '../../http/context';

const COLUMNS = [
  'testSessionId',
  'measuredOn',
  'dragAreaM2',
  's',
  'n',
  'remark',
] as const satisfies readonly (keyof CheckMeasurementFields)[];

const strikers = alias(memberships, 'strikers');

async function measurementsWhere(tx: Tx, condition: SQL | undefined): Promise<readonly CheckMeasurement[]> {
  const rows = await tx
    .select({
      ...getTableColumns(checkMeasurements),
      enteredBy: memberships.displayName,
      struckByName: strikers.displayName,
    })
    .from(checkMeasurements)
    .innerJoin(
      memberships,
      and(
        eq(memberships.organisationId, checkMeasurements.organisationId),
        eq(memberships.userId, checkMeasurements.createdBy),
      ),
    )
    .leftJoin(
      strikers,
      and(
        eq(strikers.organisationId, checkMeasurements.organisationId),
        eq(strikers.userId, checkMeasurements.struckBy),
      ),
    )
    .where(condition)
    .orderBy(asc(checkMeasurements.measuredOn), asc(checkMeasurements.createdAt), asc(checkMeasurements.id));
  return rows.map(({ enteredBy, struckByName, ...measurement }) => {
    const { id, testSessionId, measuredOn, checkBody, dragAreaM2, s, n, remark } = measurement;
    const { struckAt, struckReason, createdAt } = measurement;
    return {
      ...withoutNulls({ id, testSessionId, measuredOn, checkBody, dragAreaM2, s, n, remark }),
      enteredAt: createdAt.toISOString(),
      enteredBy,
      ...(struckAt === null || struckByName === null || struckReason === null
        ? {}
        : { struck: { at: struckAt.toISOString(), by: struckByName, reason: struckReason } }),
    };
  });
}

/** By the day of the measurement, those struck out included. */
export async function listMeasurements(tx: Tx, facilityId: string): Promise<readonly CheckMeasurement[]> {
  return measurementsWhere(tx, eq(checkMeasurements.facilityId, facilityId));
}

export async function findMeasurement(
  tx: Tx,
  facilityId: string,
  id: string,
): Promise<CheckMeasurement | undefined> {
  const [row] = await measurementsWhere(
    tx,
    and(eq(checkMeasurements.facilityId, facilityId), eq(checkMeasurements.id, id)),
  );
  return row;
}

export async function insertMeasurement(
  { tx, userId }: Work,
  facilityId: string,
  checkBody: string,
  fields: CheckMeasurementFields,
): Promise<string> {
  const [row] = await tx
    .insert(checkMeasurements)
    .values({ ...withNulls(fields, COLUMNS), facilityId, checkBody, createdBy: userId })
    .returning({ id: checkMeasurements.id });
  return present(row).id;
}

/** Whether it was struck out by this: false where it was already. */
export async function markStruck({ tx, userId, now }: Work, id: string, reason: string): Promise<boolean> {
  const rows = await tx
    .update(checkMeasurements)
    .set({ struckReason: reason, struckBy: userId, struckAt: now })
    .where(and(eq(checkMeasurements.id, id), isNull(checkMeasurements.struckAt)))
    .returning({ id: checkMeasurements.id });
  return rows.length > 0;
}
