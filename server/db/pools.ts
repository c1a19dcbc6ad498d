import { drizzle, type NodePgDatabase } from 'drizzle-orm/node-postgres';
import pg from 'pg';

export type Database = NodePgDatabase;
/** An open transaction: what repositories speak to. */
export type Tx = Parameters<Parameters<Database['transaction']>[0]>[0];

/** The two pools that a request can reach. The owner's and the maintenance login never enter the server process. */
export interface Pools {
  readonly tenant: pg.Pool;
  readonly platform: pg.Pool;
  readonly tenantDatabase: Database;
  readonly platformDatabase: Database;
  readonly close: () => Promise<void>;
}

export interface PoolSettings {
  readonly tenantUrl: string;
  readonly platformUrl: string;
  readonly maximumConnections: number;
  /** Told when an idle connection breaks (the database was stopped); the pool replaces it by itself. */
  readonly onIdleError: (error: Error) => void;
}

export function openPools(settings: PoolSettings): Pools {
  const open = (connectionString: string, name: string) => {
    const pool = new pg.Pool({
      connectionString,
      max: settings.maximumConnections,
      application_name: `wakeledger ${name}`,
      connectionTimeoutMillis: 10_000,
      idleTimeoutMillis: 30_000,
      statement_timeout: 60_000,
      idle_in_transaction_session_timeout: 60_000,
    });
    pool.on('error', settings.onIdleError);
    return pool;
  };
  const tenant = open(settings.tenantUrl, 'tenant');
  const platform = open(settings.platformUrl, 'platform');
  return {
    tenant,
    platform,
    tenantDatabase: drizzle(tenant),
    platformDatabase: drizzle(platform),
    close: async () => {
      await Promise.all([tenant.end(), platform.end()]);
    },
  };
}
