import pg from 'pg';
import { type TestDatabase, createTestDatabase } from '../../testing/test-database';
import { checkRowSecurity } from './check-rls';

let database: TestDatabase;
let client: pg.Client;
beforeAll(async () => {
  database = await createTestDatabase();
  client = new pg.Client({ connectionString: database.superuserUrl });
  await client.connect();
});
afterAll(async () => {
  await client.end();
  await database.drop();
});

test('the migrated database gives no cause for complaint', async () => {
  expect(await checkRowSecurity(client)).toEqual([]);
});

test('the owner may run the check too', async () => {
  const owner = new pg.Client({ connectionString: database.url('owner') });
  await owner.connect();
  expect(await checkRowSecurity(owner)).toEqual([]);
  await owner.end();
});

const TENANT =
  'organisation_id uuid not null references organisations (id), id uuid not null default gen_random_uuid()';
const EVERYONE = 'for all to wakeledger_tenant using (true) with check (true)';

/** Each act of sabotage and the words that the check must find for it. */
const SABOTAGE: readonly (readonly [name: string, statement: string, complaint: RegExp])[] = [
  ['a dropped policy', 'drop policy results_tenant on results', /results: the policy .* missing/],
  [
    'a policy that lets all rows through',
    `alter policy results_tenant on results using (true)`,
    /results: the policy/,
  ],
  [
    'a policy that checks nothing on the way in',
    'alter policy results_tenant on results with check (true)',
    /results: the policy/,
  ],
  ['a second, permissive policy', `create policy more on results ${EVERYONE}`, /results: the policy more/],
  [
    'a policy that asks another table',
    `alter policy variants_tenant on variants using (exists (select from programmes p where p.id = programme_id))`,
    /variants: the policy/,
  ],
  [
    'row-level security not forced',
    'alter table results no force row level security',
    /results: .*not forced/,
  ],
  ['row-level security disabled', 'alter table results disable row level security', /results: .*not enabled/],
  [
    'a new table without a policy',
    `create table leak (${TENANT}, primary key (organisation_id, id))`,
    /leak: no entry/,
  ],
  [
    'a new table outside tenants that nobody listed',
    'create table leak (id int primary key)',
    /leak: no entry/,
  ],
  [
    'a foreign key without the organisation',
    `alter table variants add constraint u unique (id, organisation_id);
     alter table variants add column o uuid;
     create unique index v on variants (id);
     alter table result_points add column v uuid references variants (id)`,
    /result_points: the foreign key .* leaves the organisation out/,
  ],
  [
    'a unique index without the organisation',
    'create unique index u on facilities (name)',
    /facilities: the unique index u leaves/,
  ],
  [
    'a view with its owner’s rights',
    'create view w as select * from results',
    /w: a view without security_invoker/,
  ],
  ['a materialised view', 'create materialized view w as select * from results', /w: materialised/],
  [
    'one right too many',
    'grant delete on results to wakeledger_tenant',
    /granted, but not in grants.ts: DELETE on results/,
  ],
  ['a right for everybody', 'grant select on users to public', /SELECT on users to PUBLIC/],
  [
    'a right on one column',
    'grant select (email) on users to wakeledger_tenant',
    /users.email to wakeledger_tenant/,
  ],
  [
    'a missing right',
    'revoke insert on results from wakeledger_tenant',
    /in grants.ts, but not granted: INSERT/,
  ],
  [
    'a function with its owner’s rights',
    'create function f() returns bigint security definer language sql as $$ select count(*) from results $$',
    /function f\(\) runs with its owner/,
  ],
  [
    'a request role that joins another',
    'grant wakeledger_maintenance to wakeledger_tenant',
    /is a member of/,
  ],
  [
    'a request role that bypasses',
    'alter role wakeledger_platform bypassrls',
    /wakeledger_platform is superuser, bypasses/,
  ],
  [
    'planner statistics of the organisation',
    'alter table results alter column organisation_id set statistics 100',
    /results: statistics are kept/,
  ],
];

test.each(SABOTAGE)('%s is noticed', async (_name, statement, complaint) => {
  await client.query('begin');
  try {
    await client.query(statement);
    expect((await checkRowSecurity(client)).join('\n')).toMatch(complaint);
  } finally {
    await client.query('rollback');
  }
});
