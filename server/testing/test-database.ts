import { randomBytes } from 'node:crypto';
import pg from 'pg';
import { connectStatements } from '../db/bootstrap';
import { type DatabaseRole, ROLE_NAMES } from '../db/roles';
import { TEMPLATE, type TestCluster, roleUrl, runStatements } from './test-cluster';

/** A migrated, empty database of a test file's own. */
export interface TestDatabase {
  readonly url: (role: DatabaseRole) => string;
  readonly superuserUrl: string;
  /** Runs one statement as a role; statements do not share a session. */
  readonly query: <Row extends pg.QueryResultRow>(
    role: DatabaseRole | 'superuser',
    text: string,
    values?: readonly unknown[],
  ) => Promise<readonly Row[]>;
  readonly drop: () => Promise<void>;
}

/** `bare`: not migrated at all, for tests of migrations themselves. */
export async function createTestDatabase(state: 'migrated' | 'bare' = 'migrated'): Promise<TestDatabase> {
  const cluster = readCluster();
  const name = `wakeledger_test_${randomBytes(6).toString('hex')}`;
  await runStatements(cluster.superuserUrl, [
    `CREATE DATABASE ${name} ${state === 'bare' ? '' : `TEMPLATE ${TEMPLATE}`} OWNER ${ROLE_NAMES.owner}`,
    ...connectStatements(name),
  ]);
  const superuserUrl = cluster.superuserUrl.replace(/\/postgres$/, `/${name}`);
  const url = (role: DatabaseRole) => roleUrl(cluster, role, name);
  const pools = new Map<DatabaseRole | 'superuser', pg.Pool>();
  return {
    url,
    superuserUrl,
    query: async <Row extends pg.QueryResultRow>(
      role: DatabaseRole | 'superuser',
      text: string,
      values: readonly unknown[] = [],
    ) => {
      const connectionString = role === 'superuser' ? superuserUrl : url(role);
      const pool = pools.get(role) ?? new pg.Pool({ connectionString, max: 2 });
      pools.set(role, pool);
      return (await pool.query<Row>(text, [...values])).rows;
    },
    drop: async () => {
      await Promise.all([...pools.values()].map((pool) => pool.end()));
      await runStatements(cluster.superuserUrl, [`DROP DATABASE ${name} WITH (FORCE)`]);
    },
  };
}

function readCluster(): TestCluster {
  const text = process.env['WAKELEDGER_TEST_CLUSTER'];
  if (text === undefined) throw new Error('Run this through jest’s project `server`: it starts the cluster.');
  return JSON.parse(text) as TestCluster;
}
