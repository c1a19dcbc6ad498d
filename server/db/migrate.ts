import { drizzle } from 'drizzle-orm/node-postgres';
import { migrate } from 'drizzle-orm/node-postgres/migrator';
import pg from 'pg';

// Any number that all versions of the product share: two starts at once migrate one after the other.
const MIGRATION_LOCK = 7_304_511;

/** Brings the database to this version, as its owner. Does nothing when it already is. */
export async function migrateDatabase(ownerUrl: string, folder: string): Promise<void> {
  const client = new pg.Client({ connectionString: ownerUrl, application_name: 'wakeledger migrations' });
  client.on('notice', () => undefined);
  await client.connect();
  try {
    await client.query('select pg_advisory_lock($1)', [MIGRATION_LOCK]);
    await migrate(drizzle(client), { migrationsFolder: folder });
  } finally {
    await client.end();
  }
}
