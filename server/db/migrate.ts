import pg from 'pg';
import { newestMigration } from './newest-migration';

// Any number that all versions of the product share: two starts at once migrate one after the other.
const MIGRATION_LOCK = 7_304_511;

/** Brings the database to this version, as its owner. Does nothing when it already is. */
export async function migrateDatabase(ownerUrl: string, folder: string): Promise<void> {
  const client = new pg.Client({ connectionString: ownerUrl, application_name: 'wakeledger migrations' });
  client.on('notice', () => undefined);
  await client.connect();
  try {
    await client.query('select pg_advisory_lock($1)', [MIGRATION_LOCK]);
    if ((await newestApplied(client)) >= newestMigration(folder)) return;
    // Loaded only when there is something to do: at most starts there is not, and it takes half a second.
    const { drizzle } = await import('drizzle-orm/node-postgres');
    const { migrate } = await import('drizzle-orm/node-postgres/migrator');
    await migrate(drizzle(client), { migrationsFolder: folder });
  } finally {
    await client.end();
  }
}

/** When the newest migration that the database has was written; 0 for a bare one. */
async function newestApplied(client: pg.Client): Promise<number> {
  const journal = await client.query<{ there: boolean }>(
    `select to_regclass('drizzle.__drizzle_migrations') is not null as there`,
  );
  if (journal.rows[0]?.there !== true) return 0;
  const { rows } = await client.query<{ newest: string | null }>(
    'select max(created_at)::text as newest from drizzle.__drizzle_migrations',
  );
  return Number(rows[0]?.newest ?? 0);
}
