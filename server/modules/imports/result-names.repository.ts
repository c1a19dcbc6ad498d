import { and, eq, isNull } from 'drizzle-orm';
import type { Tx } from '../../db/pools';
import { resultWithdrawals, results } from '../../db/tables/results';

/** Names of the programme's results that count; a withdrawn one gives its name back. */
export async function takenResultNames(tx: Tx, programmeId: string): Promise<readonly string[]> {
  const rows = await tx
    .select({ name: results.name })
    .from(results)
    .leftJoin(resultWithdrawals, eq(resultWithdrawals.resultId, results.id))
    .where(and(eq(results.programmeId, programmeId), isNull(resultWithdrawals.id)));
  return rows.map(({ name }) => name);
}
