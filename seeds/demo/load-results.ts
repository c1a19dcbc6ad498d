import type { Scenario, ScenarioResult } from './scenario/scenario-types';
import type { SeedWriter } from './seed-writer';

/** The series of running numbers that the product gives to results: the next entry goes on from here. */
const ENTRY_SERIES = 'results';

/** When a result was entered: on the evening of its test, in the order of entry. */
const evening = (date: string, order: number): string =>
  new Date(Date.parse(`${date}T16:00:00Z`) + order * 60_000).toISOString();

export async function loadResults(writer: SeedWriter, scenario: Scenario, by: string): Promise<void> {
  await loadSessions(writer, scenario.results);
  for (const [index, result] of scenario.results.entries()) {
    await loadResult(writer, result, index + 1, by);
  }
  await writer.insert('counters', {
    id: writer.id('counter', ENTRY_SERIES),
    series: ENTRY_SERIES,
    value: scenario.results.length,
  });
  await loadDecisions(writer, scenario, by);
}

const sessionKey = ({ facility, session }: ScenarioResult): string => `${facility}: ${session}`;

async function loadSessions(writer: SeedWriter, results: readonly ScenarioResult[]): Promise<void> {
  const sessions = new Map<string, ScenarioResult[]>();
  for (const result of results) {
    if (result.session === undefined) continue;
    sessions.set(sessionKey(result), [...(sessions.get(sessionKey(result)) ?? []), result]);
  }
  for (const [key, members] of sessions) {
    const days = members.map(({ testDate }) => testDate).sort();
    await writer.insert('test_sessions', {
      id: writer.id('session', key),
      facility_id: writer.id('facility', members[0]?.facility ?? ''),
      name: members[0]?.session,
      start_date: days[0],
      end_date: days.at(-1),
    });
  }
}

async function loadResult(
  writer: SeedWriter,
  result: ScenarioResult,
  entrySequence: number,
  by: string,
): Promise<void> {
  const id = writer.id('result', result.name);
  const at = evening(result.testDate, entrySequence);
  await writer.insert('results', {
    id,
    programme_id: writer.id('programme'),
    variant_id: writer.id('variant', result.variant),
    facility_id: writer.id('facility', result.facility),
    test_session_id: result.session === undefined ? undefined : writer.id('session', sessionKey(result)),
    installation: result.installation,
    entry_sequence: entrySequence,
    name: result.name,
    test_date: result.testDate,
    quantity: result.quantity,
    scale: result.scale,
    quoted_area_m2: result.quotedAreaM2,
    quoted_area_u_m2: result.quotedAreaUM2,
    quoted_area_scale: result.quotedAreaScale,
    speed_kmh: result.speedKmh,
    dynamic_pressure_pa: result.dynamicPressurePa,
    air: result.air,
    tare_already_subtracted: result.tareAlreadySubtracted,
    tare_n: result.tareN,
    condition: result.condition,
    blockage_already_corrected_by: result.blockageAlreadyCorrectedBy,
    turbulence_or_trips: result.turbulenceGenerationOrTrips,
    stated: result.stated,
    model_id: result.model,
    source: result.source,
    remark: result.remark,
    created_by: by,
    created_at: at,
  });
  for (const [position, point] of result.points.entries()) {
    await writer.insert('result_points', {
      id: writer.id('point', result.name, String(position)),
      result_id: id,
      position,
      yaw_deg: point.yawDeg,
      value: point.value,
      s: point.s,
      n: point.n,
      speed_kmh: point.speedKmh,
      dynamic_pressure_pa: point.dynamicPressurePa,
      tare_n: point.tareN,
      front_lift: point.frontLift,
      rear_lift: point.rearLift,
      side_force: point.sideForce,
    });
  }
  await writer.audit(at, by, 'result.entered', { kind: 'result', id }, { name: result.name });
}

async function loadDecisions(writer: SeedWriter, scenario: Scenario, by: string): Promise<void> {
  const orderOf = new Map(scenario.results.map(({ name }, index) => [name, index + 1]));
  for (const { result, date, reason } of scenario.withdrawals) {
    const id = writer.id('result', result);
    const at = evening(date, 200 + (orderOf.get(result) ?? 0));
    await writer.insert('result_withdrawals', {
      id: writer.id('withdrawal', result),
      result_id: id,
      reason,
      withdrawn_by: by,
      withdrawn_at: at,
    });
    await writer.audit(at, by, 'result.withdrawn', { kind: 'result', id }, { reason });
  }
  const variantOf = new Map(scenario.results.map(({ name, variant }) => [name, variant]));
  const checked = new Set<string>();
  for (const { results, rule = 'newest', date, comment } of scenario.adoptions) {
    const [first] = results;
    const key = results.join(' and ');
    const variantId = writer.id('variant', variantOf.get(first) ?? '');
    const at = evening(date, 200 + (orderOf.get(first) ?? 0));
    await writer.insert('adoptions', {
      id: writer.id('adoption', key),
      variant_id: variantId,
      evidence: rule,
      comment,
      adopted_by: by,
      adopted_at: at,
    });
    for (const result of results) {
      await writer.insert('adoption_results', {
        id: writer.id('adoption result', key, result),
        adoption_id: writer.id('adoption', key),
        variant_id: variantId,
        result_id: writer.id('result', result),
      });
      if (checked.has(result)) continue;
      checked.add(result);
      // Whoever adopts a result has looked it through.
      await writer.insert('result_states', {
        id: writer.id('checked', result),
        result_id: writer.id('result', result),
        state: 'checked',
        comment,
        set_by: by,
        set_at: at,
      });
    }
    const resultIds = results.map((result) => writer.id('result', result));
    await writer.audit(
      at,
      by,
      'result.adopted',
      { kind: 'variant', id: variantId },
      { resultIds, rule, comment },
    );
  }
}
