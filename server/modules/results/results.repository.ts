import { and, asc, eq, inArray, sql, type SQL, type SQLWrapper } from 'drizzle-orm';
import type { Result, ResultFields } from '#shared/contracts/results';
import type { Work } from '../../http/context';
import { nextNumbers } from '../../db/counters';
import type { Tx } from '../../db/pools';
import { present } from '../../db/returned-row';
import { testSessions } from '../../db/tables/facilities';
import { memberships } from '../../db/tables/organisations';
import { resultPoints, results } from '../../db/tables/results';
import { withNulls } from '../../db/without-nulls';
import { everAdopted, standingAdoptions } from './adoptions.repository';
import { judgementsOf } from './judgements.repository';
import { stateOf } from './result-state';
import { checksOf } from './states.repository';
import { withdrawalsOf } from './withdrawals.repository';

/** The series of running numbers that every result takes one of, however it comes in. */
export const ENTRY_SERIES = 'results';

const COLUMNS = [
  'variantId',
  'facilityId',
  'name',
  'testDate',
  'quantity',
  'scale',
  'quotedAreaM2',
  'quotedAreaUM2',
  'quotedAreaScale',
  'speedKmh',
  'dynamicPressurePa',
  'air',
  'tareAlreadySubtracted',
  'tareN',
  'condition',
  'blockageAlreadyCorrectedBy',
  'stated',
  'installation',
  'source',
  'remark',
  'attachmentId',
] as const satisfies readonly (keyof ResultFields)[];

const POINT_COLUMNS = [
  'yawDeg',
  'value',
  's',
  'n',
  'speedKmh',
  'dynamicPressurePa',
  'tareN',
  'frontLift',
  'rearLift',
  'sideForce',
] as const satisfies readonly (keyof ResultFields['points'][number])[];

type RawValues = Omit<
  Result,
  'points' | 'session' | 'enteredAt' | 'enteredBy' | 'state' | 'adopted' | 'withdrawn' | 'judgement'
>;

/** Everything of a result's row that goes out as it stands. */
const RAW = {
  ...Object.fromEntries(COLUMNS.map((column) => [column, results[column]])),
  id: results.id,
  programmeId: results.programmeId,
  entrySequence: results.entrySequence,
  importId: results.importId,
  model: results.modelId,
  turbulenceGenerationOrTrips: results.turbulenceOrTrips,
};

/** Named values as one, without those that are NULL: twenty thousand rows are mapped far quicker there than here. */
function asOneValue<T>(columns: Readonly<Record<string, SQLWrapper>>): SQL<T> {
  const fields = Object.entries(columns).map(([name, column]) => sql`${sql.raw(`'${name}'`)}, ${column}`);
  return sql<T>`jsonb_strip_nulls(jsonb_build_object(${sql.join(fields, sql`, `)}))`;
}

/** Results with their points and all that was decided about them: a few statements, however many results there are. */
async function select(tx: Tx, where: SQL | undefined): Promise<readonly Result[]> {
  const rows = await tx
    .select({
      raw: asOneValue<RawValues>(RAW),
      enteredAt: results.createdAt,
      session: testSessions.name,
      enteredBy: memberships.displayName,
    })
    .from(results)
    .leftJoin(testSessions, eq(testSessions.id, results.testSessionId))
    .innerJoin(memberships, eq(memberships.userId, results.createdBy))
    .where(where)
    .orderBy(asc(results.entrySequence));
  if (rows.length === 0) return [];
  const points = await pointsOf(tx, where);
  const decided = await decisionsOf(tx, where, [...new Set(rows.map(({ raw }) => raw.variantId))]);
  return rows.map(({ raw, enteredAt, session, enteredBy }) =>
    Object.assign(raw, session === null ? undefined : { session }, {
      points: [...(points.get(raw.id) ?? [])],
      enteredAt: enteredAt.toISOString(),
      enteredBy,
      ...decided(raw),
    }),
  );
}

type Decisions = Pick<Result, 'state' | 'adopted' | 'withdrawn' | 'judgement'>;

async function decisionsOf(
  tx: Tx,
  where: SQL | undefined,
  variantIds: readonly string[],
): Promise<(result: Pick<Result, 'id' | 'variantId'>) => Decisions> {
  const withdrawals = await withdrawalsOf(tx, where);
  const checks = await checksOf(tx, where);
  const judgements = await judgementsOf(tx, where);
  const ever = await everAdopted(tx, where);
  const standing = await standingAdoptions(tx, variantIds);
  return ({ id, variantId }) => {
    const withdrawn = withdrawals.get(id);
    const adopted = standing.get(variantId)?.resultIds.includes(id) ?? false;
    const state = stateOf({
      withdrawn: withdrawn !== undefined,
      checked: checks.get(id)?.state === 'checked',
      adopted,
      wasAdopted: ever.has(id),
      othersAdopted: standing.has(variantId) && !adopted,
    });
    return { state, adopted, withdrawn, judgement: judgements.get(id) };
  };
}

/**
 * The points of the results that a condition picks. Joined, not listed by id: a programme can hold more results than a
 * statement can hold parameters. Each result’s points arrive as one value, which is far quicker than a row for each.
 */
async function pointsOf(tx: Tx, where: SQL | undefined): Promise<ReadonlyMap<string, Result['points']>> {
  const point = asOneValue(Object.fromEntries(POINT_COLUMNS.map((column) => [column, resultPoints[column]])));
  const rows = await tx
    .select({
      resultId: resultPoints.resultId,
      points: sql<Result['points']>`jsonb_agg(${point} order by ${resultPoints.position})`,
    })
    .from(resultPoints)
    .innerJoin(results, eq(results.id, resultPoints.resultId))
    .where(where)
    .groupBy(resultPoints.resultId);
  return new Map(rows.map(({ resultId, points }) => [resultId, points]));
}

/** All results of a programme in the order in which they were entered, withdrawn ones included. */
export async function listResults(tx: Tx, programmeId: string): Promise<readonly Result[]> {
  return select(tx, eq(results.programmeId, programmeId));
}

export async function findResult(tx: Tx, programmeId: string, id: string): Promise<Result | undefined> {
  const [result] = await select(tx, and(eq(results.programmeId, programmeId), eq(results.id, id)));
  return result;
}

/** Those of the results named that there are in the programme. */
export async function findResults(
  tx: Tx,
  programmeId: string,
  ids: readonly string[],
): Promise<readonly Result[]> {
  if (ids.length === 0) return [];
  return select(tx, and(eq(results.programmeId, programmeId), inArray(results.id, [...ids])));
}

/** The standing result of this name; a withdrawn one gives its name free for the corrected entry. */
export async function resultOfName(tx: Tx, programmeId: string, name: string): Promise<string | undefined> {
  const [row] = await tx
    .select({ id: results.id })
    .from(results)
    .where(
      and(
        eq(results.programmeId, programmeId),
        sql`lower(${results.name}) = lower(${name})`,
        sql`not exists (select from result_withdrawals w where w.result_id = ${results.id})`,
      ),
    );
  return row?.id;
}

/**
 * Takes the next number of entry. Until the commit every other entry of the organisation waits here, so that what is
 * looked up afterwards (names that are free) still holds when this one is stored.
 */
export async function takeEntrySequence(tx: Tx, count = 1): Promise<number> {
  return nextNumbers(tx, ENTRY_SERIES, count);
}

/** An entry in a facility, found by its name or begun; it reaches from its first to its last test. */
export async function sessionOf(tx: Tx, facilityId: string, name: string, testDate: string): Promise<string> {
  const written = await tx.execute<{ id: string }>(sql`
    insert into test_sessions as s (facility_id, name, start_date, end_date)
    values (${facilityId}, ${name}, ${testDate}, ${testDate})
    on conflict (organisation_id, facility_id, lower(name)) do update
      set start_date = least(s.start_date, excluded.start_date),
          end_date = greatest(s.end_date, excluded.end_date)
    returning s.id`);
  return present(written.rows[0]).id;
}

export async function insertResult(
  work: Work,
  programmeId: string,
  fields: ResultFields,
  entrySequence: number,
): Promise<Result> {
  const testSessionId =
    fields.session === undefined
      ? null
      : await sessionOf(work.tx, fields.facilityId, fields.session, fields.testDate);
  const [row] = await work.tx
    .insert(results)
    .values({
      ...withNulls(fields, COLUMNS),
      programmeId,
      testSessionId,
      entrySequence,
      modelId: fields.model ?? null,
      turbulenceOrTrips: fields.turbulenceGenerationOrTrips ?? null,
      createdBy: work.userId,
    })
    .returning({ id: results.id });
  const { id } = present(row);
  await work.tx.insert(resultPoints).values(
    fields.points.map((point, position) => ({
      ...withNulls(point, POINT_COLUMNS),
      resultId: id,
      position,
    })),
  );
  return present(await findResult(work.tx, programmeId, id));
}
