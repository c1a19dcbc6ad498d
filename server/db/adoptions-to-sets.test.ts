import { cpSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { tenantTables } from '../testing/cross-tenant/catalogue';
import { seedOneRowEach } from '../testing/cross-tenant/one-row-each';
import { createTestDatabase, type TestDatabase } from '../testing/test-database';
import { addOrganisation } from '../testing/test-members';
import { migrateDatabase } from './migrate';

const LAST_BEFORE = '0007_check_body_of_measurement';

interface Journal {
  readonly entries: readonly { readonly tag: string }[];
}

/** The migrations as they were before adoptions rested on sets. */
function earlierMigrations(): string {
  const folder = mkdtempSync(join(tmpdir(), 'wakeledger-migrations-'));
  cpSync('migrations', folder, { recursive: true });
  const file = join(folder, 'meta', '_journal.json');
  const journal = JSON.parse(readFileSync(file, 'utf8')) as Journal;
  const last = journal.entries.findIndex(({ tag }) => tag === LAST_BEFORE);
  writeFileSync(file, JSON.stringify({ ...journal, entries: journal.entries.slice(0, last + 1) }));
  return folder;
}

describe('the step from one adopted result to a set of them', () => {
  let database: TestDatabase;
  const folder = earlierMigrations();

  beforeAll(async () => {
    database = await createTestDatabase('bare');
    await migrateDatabase(database.url('owner'), folder);
  });
  afterAll(async () => {
    await database.drop();
    rmSync(folder, { recursive: true });
  });

  it('moves what every organisation had adopted, calls it checked, and leaves row-level security in force', async () => {
    const tables = await tenantTables(database);
    for (const name of ['First Motors', 'Second Motors']) {
      await seedOneRowEach(database, tables, await addOrganisation(database, name), name);
    }
    await database.query('maintenance', 'delete from evaluations');
    await database.query('maintenance', 'delete from adoption_results');
    await database.query('maintenance', 'delete from result_states');
    const before = await database.query<{ organisation_id: string; id: string; result_id: string }>(
      'maintenance',
      'select organisation_id, id, result_id from adoptions order by organisation_id',
    );
    expect(before).toHaveLength(2);

    await migrateDatabase(database.url('owner'), 'migrations');
    const moved = await database.query(
      'maintenance',
      'select organisation_id, adoption_id as id, result_id from adoption_results order by organisation_id',
    );
    expect(moved).toEqual(before);
    const states = await database.query(
      'maintenance',
      'select organisation_id, result_id, state from result_states order by organisation_id',
    );
    expect(states).toEqual(
      before.map(({ organisation_id, result_id }) => ({ organisation_id, result_id, state: 'checked' })),
    );
    const unforced = await database.query(
      'superuser',
      `select relname from pg_class where relname in ('adoptions', 'adoption_results', 'result_states')
         and not (relrowsecurity and relforcerowsecurity)`,
    );
    expect(unforced).toEqual([]);
  });
});
