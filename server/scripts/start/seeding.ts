import type pg from 'pg';
import { loadReferenceCycles } from '../../../seeds/reference/load-reference-cycles';
import { withClient } from './database';

/** The built-in cycles: in every installation, and again after every update. */
export async function seedReference(maintenanceUrl: string): Promise<void> {
  await withClient(maintenanceUrl, (client) => inTransaction(client, () => loadReferenceCycles(client)));
}

/** The demo scenario, once, into an installation that has no organisation yet: all of it or nothing. */
export async function seedDemoOnce(maintenanceUrl: string, password: string): Promise<boolean> {
  return withClient(maintenanceUrl, async (client) => {
    const { rowCount } = await client.query('select from organisations limit 1');
    if (rowCount !== 0) return false;
    // Loaded only now: they bring half the product with them, and a second start does not need them.
    const { seedDemo } = await import('../../../seeds/demo/index');
    const { hashPassword } = await import('../../modules/session');
    const passwordHash = await hashPassword(password);
    await inTransaction(client, () => seedDemo(client, { passwordHash }));
    return true;
  });
}

async function inTransaction(client: pg.Client, work: () => Promise<void>): Promise<void> {
  await client.query('begin');
  try {
    await work();
    await client.query('commit');
  } catch (error) {
    await client.query('rollback');
    throw error;
  }
}
