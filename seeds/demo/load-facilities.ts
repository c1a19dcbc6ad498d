import type { FacilityFields } from '#shared/contracts/facilities';
import type { ScenarioCheck, ScenarioFormerVersion } from './scenario/check-bodies';
import type { Scenario } from './scenario/scenario-types';
import type { SeedWriter } from './seed-writer';

export async function loadFacilities(
  writer: SeedWriter,
  scenario: Scenario,
  by: string,
  at: string,
): Promise<void> {
  for (const [key, fields] of Object.entries(scenario.facilities)) {
    const id = writer.id('facility', key);
    await writer.insert('facilities', {
      id,
      name: fields.name,
      kind: fields.kind,
      area_m2: fields.areaM2,
      blockage: fields.blockage,
      usual_condition: fields.usualCondition,
      bias_u_relative: fields.biasURelative,
      bias_u_m2: fields.biasUM2,
      session_u_relative: fields.sessionURelative,
      session_u_m2: fields.sessionUM2,
      session_degrees_of_freedom: fields.sessionDegreesOfFreedom,
      installation_u_relative: fields.installationURelative,
      installation_u_m2: fields.installationUM2,
      installation_degrees_of_freedom: fields.installationDegreesOfFreedom,
      repeatability_u_relative: fields.repeatabilityURelative,
      repeatability_degrees_of_freedom: fields.repeatabilityDegreesOfFreedom,
      check_body: fields.checkBody,
      remark: fields.remark,
      created_at: at,
    });
    await writer.audit(at, by, 'facility.added', { kind: 'facility', id }, { name: fields.name });
    await loadVersions(writer, key, fields, scenario.formerVersions, by, at);
  }
}

/** What the facility was, oldest first, and what it is. */
async function loadVersions(
  writer: SeedWriter,
  key: string,
  fields: FacilityFields,
  formers: readonly ScenarioFormerVersion[],
  by: string,
  at: string,
): Promise<void> {
  const facilityId = writer.id('facility', key);
  const own = formers.filter(({ facility }) => facility === key);
  const versions = [...own.map(({ was }) => ({ ...fields, ...was })), fields];
  for (const [index, version] of versions.entries()) {
    const change = own[index - 1];
    const since = change === undefined ? at : `${change.until}T09:00:00Z`;
    await writer.insert('facility_versions', {
      id: writer.id('facility version', key, String(index + 1)),
      facility_id: facilityId,
      number: index + 1,
      fields: version,
      comment: change?.comment,
      created_by: by,
      created_at: since,
    });
    if (change === undefined) continue;
    const entity = { kind: 'facility', id: facilityId };
    await writer.audit(since, by, 'facility.changed', entity, { comment: change.comment });
  }
}

/** The check bodies' measurements; sessions without a result are made for them. */
export async function loadChecks(writer: SeedWriter, scenario: Scenario, by: string): Promise<void> {
  const known = new Set(scenario.results.map(({ facility, session }) => `${facility}: ${session ?? ''}`));
  for (const check of scenario.checks) {
    const session = `${check.facility}: ${check.session}`;
    if (!known.has(session)) {
      known.add(session);
      await writer.insert('test_sessions', {
        id: writer.id('session', session),
        facility_id: writer.id('facility', check.facility),
        name: check.session,
        start_date: check.date,
        end_date: check.date,
      });
    }
    await loadCheck(writer, scenario, check, session, by);
  }
}

async function loadCheck(
  writer: SeedWriter,
  scenario: Scenario,
  check: ScenarioCheck,
  session: string,
  by: string,
): Promise<void> {
  const at = `${check.date}T12:00:00Z`;
  const id = writer.id('check measurement', session, String(check.dragAreaM2));
  await writer.insert('check_measurements', {
    id,
    facility_id: writer.id('facility', check.facility),
    test_session_id: writer.id('session', session),
    measured_on: check.date,
    check_body: scenario.facilities[check.facility]?.checkBody?.name,
    drag_area_m2: check.dragAreaM2,
    s: check.s,
    n: 5,
    ...(check.struck === undefined
      ? {}
      : { struck_reason: check.struck, struck_by: by, struck_at: `${check.date}T12:30:00Z` }),
    created_by: by,
    created_at: at,
  });
  const entity = { kind: 'check-measurement', id };
  await writer.audit(at, by, 'check-measurement.entered', entity, { dragAreaM2: check.dragAreaM2 });
}
