import { loadChecks, loadFacilities } from './load-facilities';
import { loadJudgement } from './load-judgement';
import { loadResults } from './load-results';
import type { Scenario } from './scenario/scenario-types';
import { SeedWriter, type Queryable } from './seed-writer';

export interface ScenarioPeople {
  readonly organisation: { readonly id: string; readonly slug: string };
  /** Who entered and adopted everything. */
  readonly aerodynamicistId: string;
  /** Whose sign-in leads to the programme. */
  readonly memberIds: readonly string[];
}

/** A morning of work: entries of one day are told apart by the order in which they were made. */
const morning = (date: string): string => `${date}T08:30:00Z`;

/** Writes a scenario into the organisation of these people. */
export async function loadScenario(
  client: Queryable,
  scenario: Scenario,
  people: ScenarioPeople,
): Promise<void> {
  const writer = new SeedWriter(client, people.organisation);
  const by = people.aerodynamicistId;
  const beginning = morning(firstDay(scenario));
  await loadFacilities(writer, scenario, by, beginning);
  await loadProgramme(writer, scenario, by, beginning);
  await loadVariants(writer, scenario, by, beginning);
  await loadResults(writer, scenario, by);
  await loadChecks(writer, scenario, by);
  await loadJudgement(writer, scenario, by);
  for (const userId of people.memberIds) {
    await writer.insert('recent_programmes', {
      id: writer.id('recent', userId),
      user_id: userId,
      programme_id: writer.id('programme'),
    });
  }
}

/** The first frontal area was known before anything was tested. */
function firstDay({ variants }: Scenario): string {
  const days = Object.values(variants).flatMap(({ frontalAreas }) => frontalAreas.map(({ date }) => date));
  return days.sort()[0] ?? '2024-01-01';
}

async function loadProgramme(writer: SeedWriter, scenario: Scenario, by: string, at: string): Promise<void> {
  const { programme } = scenario;
  const id = writer.id('programme');
  await writer.insert('programmes', {
    id,
    name: programme.name,
    reference_speed_kmh: programme.referenceSpeedKmh,
    reference_air: programme.referenceAir,
    reference_condition: programme.referenceCondition,
    characteristic_length_m: programme.characteristicLengthM,
    characteristic_length_name: programme.characteristicLengthName,
    common_area: { kind: 'variant', variantId: writer.id('variant', programme.commonAreaOf) },
    confidence: programme.confidence,
    wind_speed_ms: programme.windSpeedMs,
    friction_line: programme.frictionLine ?? 'on',
    reference_facility_id: writer.id('facility', programme.referenceFacility),
    remark: programme.remark,
    created_at: at,
  });
  for (const { name, date } of programme.milestones) {
    await writer.insert('milestones', { id: writer.id('milestone', name), programme_id: id, name, date });
  }
  await writer.audit(at, by, 'programme.opened', { kind: 'programme', id }, { name: programme.name });
}

async function loadVariants(writer: SeedWriter, scenario: Scenario, by: string, at: string): Promise<void> {
  for (const [key, fields] of Object.entries(scenario.variants)) {
    const id = writer.id('variant', key);
    await writer.insert('variants', {
      id,
      programme_id: writer.id('programme'),
      name: fields.name,
      body_shape: fields.bodyShape,
      description: fields.description,
      length_mm: fields.lengthMm,
      width_mm: fields.widthMm,
      height_mm: fields.heightMm,
      wheelbase_mm: fields.wheelbaseMm,
      aliases: fields.aliases,
      created_at: at,
    });
    for (const [position, area] of fields.frontalAreas.entries()) {
      await writer.insert('frontal_areas', {
        id: writer.id('frontal area', key, area.date),
        variant_id: id,
        position,
        area_m2: area.areaM2,
        u_m2: area.uM2,
        method: area.method,
        date: area.date,
        remark: area.remark,
      });
    }
    for (const [position, configuration] of fields.configurations.entries()) {
      await writer.insert('configurations', {
        id: writer.id('configuration', key, configuration.name),
        variant_id: id,
        position,
        name: configuration.name,
        mass_kg: configuration.massKg,
        rolling_resistance: configuration.rollingResistance,
        road_load_reference: configuration.roadLoadReference,
        electric: configuration.electric,
        combustion: configuration.combustion,
        sales_share: configuration.salesShare,
      });
    }
    await writer.audit(at, by, 'variant.added', { kind: 'variant', id }, { name: fields.name });
  }
}
