import { and, desc, eq, isNull, sql, type SQL } from 'drizzle-orm';
import type { TestSession, TestSessionFields } from '#shared/contracts/test-sessions';
import { present } from '../../db/returned-row';
import type { Tx } from '../../db/pools';
import { checkMeasurements, testSessions } from '../../db/tables/facilities';
import { results } from '../../db/tables/results';
import { withNulls, withoutNulls } from '../../db/without-nulls';
import type { Days } from './test-sessions.policy';

const COLUMNS = [
  'name',
  'startDate',
  'endDate',
  'remark',
] as const satisfies readonly (keyof TestSessionFields)[];

/** The counts in plain SQL: the query builder names no table in a query of one table, also not within a subquery. */
const SHOWN = {
  id: testSessions.id,
  facilityId: testSessions.facilityId,
  name: testSessions.name,
  startDate: testSessions.startDate,
  endDate: testSessions.endDate,
  remark: testSessions.remark,
  version: testSessions.version,
  results: sql<number>`(select count(*)::integer from results r where r.test_session_id = test_sessions.id)`,
  installations: sql<string[]>`(
    select coalesce(array_agg(distinct r.installation), '{}') from results r
    where r.test_session_id = test_sessions.id and r.installation is not null
  )`,
  checkMeasurements: sql<number>`(
    select count(*)::integer from check_measurements m
    where m.test_session_id = test_sessions.id and m.struck_at is null
  )`,
};

async function sessionsWhere(tx: Tx, condition: SQL | undefined): Promise<readonly TestSession[]> {
  const rows = await tx
    .select(SHOWN)
    .from(testSessions)
    .where(condition)
    .orderBy(
      sql`${testSessions.startDate} desc nulls first`,
      sql`lower(${testSessions.name})`,
      desc(testSessions.id),
    );
  return rows.map((row) => withoutNulls(row));
}

/** Newest first; those without a date, which are still to come, before them. */
export async function listSessions(tx: Tx, facilityId: string): Promise<readonly TestSession[]> {
  return sessionsWhere(tx, eq(testSessions.facilityId, facilityId));
}

export async function findSession(tx: Tx, facilityId: string, id: string): Promise<TestSession | undefined> {
  const [row] = await sessionsWhere(
    tx,
    and(eq(testSessions.facilityId, facilityId), eq(testSessions.id, id)),
  );
  return row;
}

/** As `findSession`, and nobody else changes it until the transaction ends. */
export async function lockSession(tx: Tx, facilityId: string, id: string): Promise<TestSession | undefined> {
  await tx
    .select({ id: testSessions.id })
    .from(testSessions)
    .where(eq(testSessions.id, id))
    .for('no key update');
  return findSession(tx, facilityId, id);
}

export async function sessionOfName(tx: Tx, facilityId: string, name: string): Promise<string | undefined> {
  const [row] = await tx
    .select({ id: testSessions.id })
    .from(testSessions)
    .where(and(eq(testSessions.facilityId, facilityId), sql`lower(${testSessions.name}) = lower(${name})`));
  return row?.id;
}

export async function insertSession(tx: Tx, facilityId: string, fields: TestSessionFields): Promise<string> {
  const [row] = await tx
    .insert(testSessions)
    .values({ ...withNulls(fields, COLUMNS), facilityId })
    .returning({ id: testSessions.id });
  return present(row).id;
}

export async function updateSession(tx: Tx, id: string, fields: TestSessionFields): Promise<void> {
  await tx
    .update(testSessions)
    .set({ ...withNulls(fields, COLUMNS), version: sql`${testSessions.version} + 1` })
    .where(eq(testSessions.id, id));
}

/** The days on which results and the check body were measured in a session. */
export async function measuredDays(tx: Tx, id: string): Promise<Days | undefined> {
  const days = tx
    .select({ day: sql<string>`${results.testDate}`.as('day') })
    .from(results)
    .where(eq(results.testSessionId, id))
    .unionAll(
      tx
        .select({ day: sql<string>`${checkMeasurements.measuredOn}`.as('day') })
        .from(checkMeasurements)
        .where(and(eq(checkMeasurements.testSessionId, id), isNull(checkMeasurements.struckAt))),
    )
    .as('days');
  const [row] = await tx
    .select({
      first: sql<string | null>`min(${days.day})::text`,
      last: sql<string | null>`max(${days.day})::text`,
    })
    .from(days);
  if (!row || row.first === null || row.last === null) return undefined;
  return { first: row.first, last: row.last };
}

/** A session reaches from its first to its last measurement; one without dates takes them from the first. */
export async function widenSession(tx: Tx, id: string, day: string): Promise<void> {
  await tx
    .update(testSessions)
    .set({
      startDate: sql`least(${testSessions.startDate}, ${day}::date)`,
      endDate: sql`greatest(${testSessions.endDate}, ${day}::date)`,
    })
    .where(eq(testSessions.id, id));
}
