import { join } from 'node:path';
import { migrateDatabase } from '../db/migrate';
import { currentUrls } from './start/database';
import { seedReference } from './start/seeding';

/** `npm run migrate`: brings the database to this version and its built-in cycles with it. */
const { urls } = currentUrls(process.env, process.cwd());
await migrateDatabase(urls.owner, join(process.cwd(), 'migrations'));
await seedReference(urls.maintenance);
process.stdout.write('The database is at this version.\n');
