import { randomUUID } from 'node:crypto';
import pg from 'pg';
import * as z from 'zod';
import { endpoint } from '#shared/contracts/endpoint';
import { programmeParams, nothing } from '#shared/contracts/common';
import { route } from '../../http/module';
import { MODULES } from '../../modules/registry';
import { type ApiHarness, startApi } from '../api-harness';
import { type TenantTable, tenantTables } from './catalogue';
import { type RowsByTable, seedOneRowEach } from './one-row-each';
import { probeTables, type Tenants } from './probe-tables';
import { walkRoutes } from './walk-routes';

jest.setTimeout(120_000);

const MARKER = 'first-organisation-only';
let tenants: Tenants;
let api: ApiHarness;
let tables: readonly TenantTable[];
let victim: RowsByTable;
let intruder: RowsByTable;

/** A route that asks another's database rows past every policy: what the walk must notice. */
const careless = route(
  endpoint({
    kind: 'json',
    method: 'GET',
    path: '/api/v1/careless/:programmeId',
    summary: 'Reads past row-level security',
    access: 'programmes.read',
    params: programmeParams,
    query: nothing,
    body: nothing,
    response: z.strictObject({ known: z.boolean() }),
    command: false,
    versioned: false,
    problems: [],
  }),
  async ({ params }) => {
    const rows = await api.database.query('superuser', 'select from programmes where id = $1', [
      params.programmeId,
    ]);
    return { known: rows.length > 0 };
  },
);

beforeAll(async () => {
  api = await startApi({ modules: [...MODULES, { name: 'careless', routes: [careless] }] });
  tables = await tenantTables(api.database);
  victim = await seedOneRowEach(api.database, tables, api.first, MARKER);
  intruder = await seedOneRowEach(api.database, tables, api.second, 'second');
  // Many rows and fresh statistics, so that the planner could tell something if it were allowed to.
  await api.database.query(
    'superuser',
    `insert into counters (organisation_id, series, value) select $1, 'series ' || n, n from generate_series(1, 3000) n`,
    [api.first.id],
  );
  await api.database.query('superuser', 'analyze');
  tenants = {
    tables,
    victim: { id: api.first.id, rows: victim },
    intruder: { id: api.second.id, rows: intruder },
  };
});
afterAll(() => api.close());

/** Everything that the first organisation has, as one fingerprint. */
async function fingerprint(): Promise<string> {
  const parts = tables.map(
    ({ name }) =>
      `select '${name}' as t, t::text as row from ${name} t where organisation_id = '${api.first.id}'`,
  );
  const [row] = await api.database.query<{ all: string }>(
    'superuser',
    `select md5(string_agg(t || row, '|' order by t, row)) as all from (${parts.join(' union all ')}) everything`,
  );
  return row?.all ?? '';
}

test('with the request roles themselves, over every table, nothing of another organisation is within reach', async () => {
  const before = await fingerprint();
  expect(await probeTables(api.database, tenants)).toEqual([]);
  expect(await fingerprint()).toBe(before);
});

test('over every route, a foreign id is answered like an unknown one and nothing of the other is told', async () => {
  const before = await fingerprint();
  const routes = MODULES.flatMap((module) => module.routes);
  expect(await walkRoutes({ api, routes, victim, intruder, marker: MARKER })).toEqual([]);
  expect(await fingerprint()).toBe(before);
});

test('a route that reads past the policies turns the walk red', async () => {
  const leaks = await walkRoutes({ api, routes: [careless], victim, intruder, marker: MARKER });
  expect(leaks.join()).toMatch('GET /api/v1/careless/:programmeId (programmeId): a foreign id is answered');
});

describe('statistics of all organisations together', () => {
  const PEEKS = [
    'select * from pg_stats',
    'select * from pg_stat_user_tables',
    'select * from pg_stat_activity',
    'select * from pg_statio_user_tables',
    `select pg_stat_get_live_tuples('results'::regclass)`,
    `select pg_relation_size('results'::regclass)`,
    'select reltuples from pg_class',
    'select * from pg_statistic',
  ];

  test.each(PEEKS)('`%s` is refused to the request roles', async (statement) => {
    for (const role of ['tenant', 'platform'] as const) {
      await expect(api.database.query(role, statement)).rejects.toMatchObject({ code: '42501' });
    }
  });
});

test('two organisations may use the same name, and ON CONFLICT does not see the other’s', async () => {
  const client = new pg.Client({ connectionString: api.database.url('tenant') });
  await client.connect();
  await client.query('begin');
  await client.query(`select set_config('app.organisation_id', $1, true)`, [api.second.id]);
  const name = victim.get('facilities')?.['name'];
  const { rowCount } = await client.query(
    `insert into facilities (name, kind, usual_condition) values ($1, 'road', '{}') on conflict do nothing`,
    [name],
  );
  await client.query('rollback');
  await client.end();
  expect(rowCount).toBe(1);
});

describe('sabotage turns the probe red', () => {
  const KEY = 'primary key (organisation_id, id)';
  const CANARIES: readonly (readonly [name: string, sabotage: string, repair: string, leak: RegExp])[] = [
    [
      'a new table without a policy',
      `create table canary (organisation_id uuid not null, id uuid not null default gen_random_uuid(), ${KEY});
       grant select, insert, update, delete on canary to wakeledger_tenant, wakeledger_maintenance`,
      'drop table canary',
      /canary: rows of another are read/,
    ],
    [
      'a policy that lets everything through',
      'alter policy variants_tenant on variants using (true) with check (true)',
      `alter policy variants_tenant on variants
         using (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid)
         with check (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid)`,
      /variants: rows of another are counted/,
    ],
    [
      'a policy without a check on the way in',
      'alter policy facilities_tenant on facilities with check (true)',
      `alter policy facilities_tenant on facilities
         with check (organisation_id = nullif(current_setting('app.organisation_id', true), '')::uuid)`,
      /facilities: a row is put into another’s/,
    ],
    [
      'a foreign key without the organisation',
      `create unique index canary on variants (id);
       alter table results add constraint canary foreign key (variant_id) references variants (id);
       alter table results drop constraint results_variant_fkey;
       alter table adoption_results drop constraint adoption_results_result_fkey`,
      'alter table results drop constraint canary; drop index canary',
      /results: canary refers to another’s row/,
    ],
    [
      'planner statistics of the organisation',
      'alter table counters alter column organisation_id set statistics 100; analyze counters',
      'alter table counters alter column organisation_id set statistics 0; analyze counters',
      /counters: EXPLAIN tells of another’s rows/,
    ],
  ];

  test.each(CANARIES)('%s', async (_name, sabotage, repair, leak) => {
    await api.database.query('superuser', sabotage);
    try {
      const all = await tenantTables(api.database);
      const canary = all.filter((table) => table.name === 'canary');
      const rows = async (organisation: typeof api.first, known: RowsByTable) =>
        new Map([...known, ...(await seedOneRowEach(api.database, canary, organisation, randomUUID()))]);
      const found = await probeTables(api.database, {
        tables: all.filter((table) => leak.source.startsWith(`${table.name}:`)),
        victim: { id: api.first.id, rows: await rows(api.first, victim) },
        intruder: { id: api.second.id, rows: await rows(api.second, intruder) },
      });
      expect(found.join('\n')).toMatch(leak);
    } finally {
      await api.database.query('superuser', repair);
    }
  });
});
