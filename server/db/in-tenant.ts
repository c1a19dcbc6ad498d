import { sql } from 'drizzle-orm';
import type { PgTransactionConfig } from 'drizzle-orm/pg-core';
import type { Pools, Tx } from './pools';

/** Whose work a transaction is. */
export interface TenantIdentity {
  readonly organisationId: string;
  readonly userId?: string;
  readonly requestId?: string;
}

export type TransactionMode = 'read' | 'write';

// Readers see one moment throughout, however many statements they need.
const CONFIGURATION: Readonly<Record<TransactionMode, PgTransactionConfig>> = {
  read: { accessMode: 'read only', isolationLevel: 'repeatable read' },
  write: { accessMode: 'read write', isolationLevel: 'read committed' },
};

/**
 * Runs `work` in one transaction inside one organisation: the only way to a tenant's rows. The organisation is a
 * bound parameter and local to the transaction, so a pooled connection never carries it further.
 */
export async function inTenant<T>(
  pools: Pools,
  identity: TenantIdentity,
  mode: TransactionMode,
  work: (tx: Tx) => Promise<T>,
): Promise<T> {
  return pools.tenantDatabase.transaction(async (tx) => {
    await tx.execute(
      sql`select set_config('app.organisation_id', ${identity.organisationId}, true),
        set_config('app.user_id', ${identity.userId ?? ''}, true),
        set_config('app.request_id', ${identity.requestId ?? ''}, true)`,
    );
    return work(tx);
  }, CONFIGURATION[mode]);
}

/**
 * Runs `work` as the platform role: sign-in, and which organisations a person belongs to. With `userId` the
 * memberships of that one person are visible; without, none are.
 */
export async function inPlatform<T>(
  pools: Pools,
  userId: string | undefined,
  mode: TransactionMode,
  work: (tx: Tx) => Promise<T>,
): Promise<T> {
  return pools.platformDatabase.transaction(async (tx) => {
    await tx.execute(sql`select set_config('app.user_id', ${userId ?? ''}, true)`);
    return work(tx);
  }, CONFIGURATION[mode]);
}
