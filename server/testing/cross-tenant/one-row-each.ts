import { randomUUID } from 'node:crypto';
import type { TestDatabase } from '../test-database';
import type { TestOrganisation } from '../test-members';
import type { Column, TenantTable } from './catalogue';

export type Row = Readonly<Record<string, unknown>>;
export type RowsByTable = ReadonlyMap<string, Row>;

const IMPORT = {
  options: null,
  encoding: 'utf-8',
  delimiter: ';',
  decimal: null,
  mapping: JSON.stringify({ columns: [], constants: [], variants: [], facilities: [] }),
  summary: JSON.stringify({
    encoding: 'utf-8',
    delimiter: ';',
    blankLines: 0,
    notes: [],
    columns: [],
    mappingRemembered: false,
  }),
};

const POLICIES = {
  machCaution: 0.2,
  machExcluded: 0.3,
  blockageCaution: 0.05,
  blockageExcluded: 0.1,
  openJetLimit: 0.35,
  minimumReynolds: 2e6,
  reynoldsToleranceM2: 0.005,
  frictionShare: 0.12,
  frictionShareU: 0.06,
  yawCoverageDeg: 10,
  repeatabilityCaution: 0.01,
  airTemperatureC: { from: 5, to: 40 },
  airPressurePa: { from: 85000, to: 106000 },
  frontLiftLimit: 0.3,
  rearLiftLimit: 0.3,
  plausible: [],
};

/** The inputs of an evaluation: a programme without results, which comes to nothing. */
const EVALUATED = {
  programme: {
    referenceSpeedKmh: 120,
    referenceAir: { state: 'iso-2533-sea-level' },
    characteristicLengthM: 4.5,
    commonAreaM2: 2,
  },
  facilities: [],
  variants: [],
  results: [],
};

const OUTCOME = {
  query: {},
  comparison: {
    moves: [],
    probabilities: [],
    bracketsGained: [],
    bracketsLost: [],
    entering: [],
    leaving: [],
    exclusionsGained: [],
    exclusionsLost: [],
    changed: false,
  },
  ground: [],
  resultNames: [],
};

/** Values that no rule can guess: what a JSON column must hold so that the product can read the row. */
const BY_HAND: Readonly<Record<string, Readonly<Record<string, unknown>>>> = {
  programmes: {
    confidence: 0.9,
    reference_air: '{"state":"iso-2533-sea-level"}',
    reference_condition: '{}',
    common_area: '{"kind":"fixed","areaM2":2}',
  },
  facilities: { usual_condition: '{}', blockage: null, check_body: null },
  facility_versions: { fields: '{"name":"a","kind":"road","usualCondition":{}}' },
  policy_versions: { values: JSON.stringify(POLICIES) },
  adjustments: { item: 'ground', body_shapes: [], from_value: '"a"', to_value: '"b"' },
  correlation_versions: { replaces: [], pairs: '[]' },
  result_judgements: { reynolds: '{"kind":"friction-line"}' },
  evaluations: {
    inputs: JSON.stringify(EVALUATED),
    parameters:
      '{"policyId":null,"frictionLine":null,"facilityVersions":[],"correlationIds":[],"adjustmentIds":[]}',
    output:
      '{"zeroYaw":null,"windAveraged":null,"usedResultIds":[],"combination":null,"results":[],"excluded":[]}',
  },
  proposals: { changes: '[]', outcome: JSON.stringify(OUTCOME) },
  test_plans: {
    inputs:
      '{"scale":0.4,"target":{"basis":"reference"},"tunnelTemperatureC":20,"tunnelPressurePa":100000,"frontalAreaM2":2.2,"dragCoefficient":0.3,"condition":{}}',
  },
  configurations: {
    rolling_resistance: 0.008,
    road_load_reference: null,
    electric: null,
    combustion: null,
    sales_share: 1,
  },
  variants: { body_shape: 'hatch' },
  frontal_areas: { area_m2: 2, u_m2: 0.01 },
  attachments: { content: Buffer.from('x'), bytes: 1, media_type: 'image/png', purpose: 'picture' },
  results: { air: null, stated: null, condition: '{}', scale: 1 },
  result_points: { yaw_deg: 0 },
  imports: { header: '["a"]', ...IMPORT, failure: null },
  import_rows: { cells: '["a"]', reasons: '[]', fixes: '{}' },
  cycles: {
    time_s: [0, 10, 20],
    speed_kmh: [0, 30, 0],
    totals:
      '{"durationS":20,"distanceM":83.3,"maximumSpeedKmh":30,"meanSpeedKmh":15,"maximumAccelerationMs2":0.83,"cautions":[]}',
  },
  audit_events: { summary: '[]' },
};

/** Columns that say that a row no longer counts stay empty: what counts is what could leak. */
const EMPTY = /^(retired|ended|withdrawn|cancel_requested|finished|sent|struck)_at$/;

/**
 * Puts one row of the organisation's own into every tenant table, each text carrying `marker`. Written by the maintenance
 * login from the catalogue alone, so that a new table is covered when it is created.
 */
export async function seedOneRowEach(
  database: TestDatabase,
  tables: readonly TenantTable[],
  organisation: TestOrganisation,
  marker: string,
): Promise<RowsByTable> {
  const rows = new Map<string, Row>();
  for (const table of tables) {
    if (table.name === 'memberships') {
      const [member] = await database.query<Row & { [key: string]: unknown }>(
        'maintenance',
        'select * from memberships where organisation_id = $1 order by created_at limit 1',
        [organisation.id],
      );
      rows.set(table.name, member ?? {});
      continue;
    }
    const values = Object.fromEntries(
      table.columns.map((column) => [column.name, valueOf(table, column, organisation, rows, marker)]),
    );
    const names = Object.keys(values);
    const [row] = await database.query<Row & { [key: string]: unknown }>(
      'maintenance',
      `insert into ${table.name} (${names.join(', ')}) values (${names.map((_n, i) => `$${i + 1}`).join(', ')}) returning *`,
      names.map((name) => values[name]),
    );
    rows.set(table.name, row ?? {});
  }
  return rows;
}

function valueOf(
  table: TenantTable,
  column: Column,
  organisation: TestOrganisation,
  rows: RowsByTable,
  marker: string,
): unknown {
  if (column.name === 'organisation_id') return organisation.id;
  if (column.name === 'id') return randomUUID();
  const byHand = BY_HAND[table.name]?.[column.name];
  if (byHand !== undefined) return byHand;
  for (const reference of table.references) {
    const place = reference.columns.indexOf(column.name);
    const target = rows.get(reference.target);
    if (place >= 0 && target !== undefined) return target[reference.targetColumns[place] ?? ''];
  }
  if (EMPTY.test(column.name) && !column.notNull) return null;
  return plainValue(table, column, marker);
}

function plainValue(table: TenantTable, column: Column, marker: string): unknown {
  const allowed = allowedText(table, column.name);
  if (allowed !== undefined) return allowed;
  if (column.type === 'text') return `${marker} ${table.name}.${column.name}`;
  if (column.type === 'text[]') return [`${marker} ${table.name}.${column.name}`];
  if (column.type === 'uuid') return randomUUID();
  if (column.type === 'jsonb') return '{}';
  if (column.type === 'boolean') return false;
  if (column.type === 'date') return '2026-03-01';
  if (column.type.startsWith('timestamp')) return new Date(Date.UTC(2026, 2, 1));
  if (column.type === 'bytea') return Buffer.from(marker);
  if (/^(integer|bigint|double precision|numeric)$/.test(column.type)) return 1;
  if (/^(integer|bigint|double precision)\[\]$/.test(column.type)) return [1];
  throw new Error(`${table.name}.${column.name}: no rule makes a value of the type ${column.type}`);
}

/** The first of the words that a CHECK allows. */
function allowedText(table: TenantTable, column: string): string | undefined {
  for (const check of table.checks) {
    const list = new RegExp(`\\(?\\(?\\b${column}\\b\\)?(?:::text)? = ANY \\(+ARRAY\\[([^\\]]*)\\]`).exec(
      check,
    )?.[1];
    const first = list === undefined ? undefined : /'([^']*)'/.exec(list)?.[1];
    if (first !== undefined) return first;
  }
  return undefined;
}
