import { sql } from 'drizzle-orm';
import type { IRouter } from 'express';
import { inPlatform } from '../db/in-tenant';
import type { Pools } from '../db/pools';
import { ProblemError } from './problem-error';

/** `/healthz`: the process answers. `/readyz`: the database answers too and stands at this code's migrations. */
export function serveHealth(router: IRouter, pools: Pools, expectedMigration: number): void {
  router.get('/healthz', (_req, res) => {
    res.setHeader('Cache-Control', 'no-store');
    res.json({ status: 'alive' });
  });
  router.get('/readyz', async (_req, res) => {
    res.setHeader('Cache-Control', 'no-store');
    const applied = await appliedMigration(pools);
    if (applied !== expectedMigration) {
      throw new ProblemError('not-ready', {
        detail:
          applied === undefined
            ? 'The database does not answer.'
            : 'The migrations are not those of this version.',
      });
    }
    res.json({ status: 'ready' });
  });
}

async function appliedMigration(pools: Pools): Promise<number | undefined> {
  try {
    return await inPlatform(pools, undefined, 'read', async (tx) => {
      await tx.execute(sql`set local statement_timeout = 2000`);
      const answer = await tx.execute<{ newest: string | null }>(
        sql`select max(created_at)::text as newest from drizzle.__drizzle_migrations`,
      );
      return Number(answer.rows[0]?.newest ?? 0);
    });
  } catch {
    return undefined;
  }
}
