import { eq, inArray, sql } from 'drizzle-orm';
import type { ResultFields } from '#shared/contracts/results';
import type { Work } from '../../http/context';
import type { Tx } from '../../db/pools';
import { results } from '../../db/tables/results';
import { variants } from '../../db/tables/variants';

export interface ResultToStore {
  readonly fields: ResultFields;
  readonly rowNumber: number;
  readonly entrySequence: number;
}

interface Place {
  readonly importId: string;
  readonly programmeId: string;
}

/**
 * Stores results and their points, a batch in three statements: the batch travels as one JSON parameter, and the database
 * takes it apart into rows.
 */
export async function storeResults(work: Work, place: Place, batch: readonly ResultToStore[]): Promise<void> {
  if (batch.length === 0) return;
  const sessions = await sessionIds(work.tx, batch);
  const list = batch.map(({ fields, rowNumber, entrySequence }) => {
    const { points: _points, session, ...rest } = fields;
    const sessionId =
      session === undefined ? undefined : sessions.get(sessionKey(fields.facilityId, session));
    return { ...rest, sessionId, rowNumber, entrySequence };
  });
  const { rows } = await work.tx.execute<{ id: string; entry_sequence: string }>(sql`
    insert into results (programme_id, import_id, created_by, created_at, import_row, entry_sequence, variant_id, facility_id,
      test_session_id, installation, name, test_date, quantity, scale, quoted_area_m2, quoted_area_u_m2,
      quoted_area_scale, speed_kmh, dynamic_pressure_pa, air, tare_already_subtracted, tare_n, condition,
      blockage_already_corrected_by, turbulence_or_trips, stated, model_id, source, remark)
    select ${place.programmeId}, ${place.importId}, ${work.userId}, ${work.now.toISOString()}::timestamptz, r."rowNumber",
      r."entrySequence", r."variantId", r."facilityId", r."sessionId", r.installation, r.name, r."testDate", r.quantity, r.scale,
      r."quotedAreaM2", r."quotedAreaUM2", r."quotedAreaScale", r."speedKmh", r."dynamicPressurePa", r.air,
      r."tareAlreadySubtracted", r."tareN", r.condition, r."blockageAlreadyCorrectedBy", r."turbulenceGenerationOrTrips",
      r.stated, r.model, r.source, r.remark
    from jsonb_to_recordset(${JSON.stringify(list)}::jsonb) as r("rowNumber" int, "entrySequence" bigint, "variantId" uuid,
      "facilityId" uuid, "sessionId" uuid, installation text, name text, "testDate" date, quantity text, scale float8,
      "quotedAreaM2" float8, "quotedAreaUM2" float8, "quotedAreaScale" text, "speedKmh" float8, "dynamicPressurePa" float8,
      air jsonb, "tareAlreadySubtracted" boolean, "tareN" float8, condition jsonb, "blockageAlreadyCorrectedBy" text,
      "turbulenceGenerationOrTrips" boolean, stated jsonb, model text, source text, remark text)
    returning id, entry_sequence`);
  const idOf = new Map(rows.map(({ id, entry_sequence }) => [Number(entry_sequence), id]));
  await storePoints(
    work.tx,
    batch.flatMap(({ fields, entrySequence }) =>
      fields.points.map((point, position) => ({ ...point, position, resultId: idOf.get(entrySequence) })),
    ),
  );
}

async function storePoints(tx: Tx, points: readonly object[]): Promise<void> {
  await tx.execute(sql`
    insert into result_points (result_id, position, yaw_deg, value, s, n, speed_kmh, dynamic_pressure_pa, tare_n, front_lift,
      rear_lift, side_force)
    select p."resultId", p.position, p."yawDeg", p.value, p.s, p.n, p."speedKmh", p."dynamicPressurePa", p."tareN",
      p."frontLift", p."rearLift", p."sideForce"
    from jsonb_to_recordset(${JSON.stringify(points)}::jsonb) as p("resultId" uuid, position int, "yawDeg" float8, value float8,
      s float8, n int, "speedKmh" float8, "dynamicPressurePa" float8, "tareN" float8, "frontLift" float8, "rearLift" float8,
      "sideForce" float8)`);
}

const sessionKey = (facilityId: string, name: string): string => `${facilityId}\u001f${name.toLowerCase()}`;

/** The sessions that a batch names, made where they are not there yet and widened to its dates. */
async function sessionIds(tx: Tx, batch: readonly ResultToStore[]): Promise<ReadonlyMap<string, string>> {
  const found = new Map<string, { facilityId: string; name: string; start: string; end: string }>();
  for (const { fields } of batch) {
    const { facilityId, session, testDate } = fields;
    if (session === undefined) continue;
    const key = sessionKey(facilityId, session);
    const known = found.get(key);
    found.set(key, {
      facilityId,
      name: known?.name ?? session,
      start: known === undefined || testDate < known.start ? testDate : known.start,
      end: known === undefined || testDate > known.end ? testDate : known.end,
    });
  }
  if (found.size === 0) return new Map();
  const { rows } = await tx.execute<{ id: string; facility_id: string; name: string }>(sql`
    insert into test_sessions as s (facility_id, name, start_date, end_date)
    select r."facilityId", r.name, r.start, r."end"
    from jsonb_to_recordset(${JSON.stringify([...found.values()])}::jsonb)
      as r("facilityId" uuid, name text, start date, "end" date)
    on conflict (organisation_id, facility_id, lower(name)) do update
      set start_date = least(s.start_date, excluded.start_date), end_date = greatest(s.end_date, excluded.end_date)
    returning id, facility_id, name`);
  return new Map(rows.map(({ id, facility_id, name }) => [sessionKey(facility_id, name), id]));
}

/** Remembers how a variant is called in files; the variant counts as changed. */
export async function addAliases(tx: Tx, variantId: string, aliases: readonly string[]): Promise<void> {
  await tx.execute(sql`
    update variants set version = version + 1, aliases = aliases || (
      select coalesce(array_agg(fresh), '{}') from jsonb_array_elements_text(${JSON.stringify(aliases)}::jsonb) fresh
      where lower(fresh) <> lower(name) and not exists (select from unnest(aliases) known where lower(known) = lower(fresh)))
    where id = ${variantId}`);
}

/** Nobody adopts a result of these variants until the transaction ends. */
export async function lockVariantsOfImport(tx: Tx, importId: string): Promise<void> {
  const ids = tx
    .selectDistinct({ id: results.variantId })
    .from(results)
    .where(eq(results.importId, importId));
  await tx
    .select({ id: variants.id })
    .from(variants)
    .where(inArray(variants.id, ids))
    .orderBy(variants.id)
    .for('no key update');
}

/** The names of the import's results that some variant rests on. */
export async function adoptedOfImport(tx: Tx, importId: string): Promise<readonly string[]> {
  const { rows } = await tx.execute<{ name: string }>(sql`
    select r.name from results r
    join lateral (select a.id from adoptions a where a.variant_id = r.variant_id
      order by a.adopted_at desc, a.id desc limit 1) newest on true
    join adoption_results ar on ar.adoption_id = newest.id and ar.result_id = r.id
    where r.import_id = ${importId} order by r.name limit 20`);
  return rows.map(({ name }) => name);
}

/** Withdraws what still counts; returns how many. */
export async function withdrawResultsOf(work: Work, importId: string, reason: string): Promise<number> {
  const { rows } = await work.tx.execute<{ id: string }>(sql`
    insert into result_withdrawals (result_id, reason, withdrawn_by)
    select r.id, ${reason}, ${work.userId} from results r
    where r.import_id = ${importId} and not exists (select from result_withdrawals w where w.result_id = r.id)
    returning id`);
  return rows.length;
}
