import { eq, type SQL } from 'drizzle-orm';
import type { Result } from '#shared/contracts/results';
import type { Work } from '../../http/context';
import type { Tx } from '../../db/pools';
import { memberships } from '../../db/tables/organisations';
import { resultWithdrawals, results } from '../../db/tables/results';

/** Which of the results that a condition picks no longer count, with when, by whom and why. */
export async function withdrawalsOf(
  tx: Tx,
  where: SQL | undefined,
): Promise<ReadonlyMap<string, NonNullable<Result['withdrawn']>>> {
  const rows = await tx
    .select({
      resultId: resultWithdrawals.resultId,
      at: resultWithdrawals.withdrawnAt,
      by: memberships.displayName,
      reason: resultWithdrawals.reason,
    })
    .from(resultWithdrawals)
    .innerJoin(results, eq(results.id, resultWithdrawals.resultId))
    .innerJoin(memberships, eq(memberships.userId, resultWithdrawals.withdrawnBy))
    .where(where);
  return new Map(rows.map(({ resultId, at, ...rest }) => [resultId, { ...rest, at: at.toISOString() }]));
}

export async function insertWithdrawals(
  work: Work,
  resultIds: readonly string[],
  reason: string,
): Promise<void> {
  await work.tx
    .insert(resultWithdrawals)
    .values(resultIds.map((resultId) => ({ resultId, reason, withdrawnBy: work.userId })));
}
