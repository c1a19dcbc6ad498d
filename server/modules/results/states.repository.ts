import { desc, eq, type SQL } from 'drizzle-orm';
import type { Work } from '../../http/context';
import type { Tx } from '../../db/pools';
import { memberships } from '../../db/tables/organisations';
import { results, resultStates } from '../../db/tables/results';

export interface StateChange {
  readonly state: 'entered' | 'checked';
  readonly comment: string;
  readonly at: string;
  readonly by: string;
}

const COLUMNS = {
  resultId: resultStates.resultId,
  state: resultStates.state,
  comment: resultStates.comment,
  at: resultStates.setAt,
  by: memberships.displayName,
};

/** Whether somebody has checked each of the results that a condition picks: the newest word on it. */
export async function checksOf(tx: Tx, where: SQL | undefined): Promise<ReadonlyMap<string, StateChange>> {
  const rows = await tx
    .selectDistinctOn([resultStates.resultId], COLUMNS)
    .from(resultStates)
    .innerJoin(results, eq(results.id, resultStates.resultId))
    .innerJoin(memberships, eq(memberships.userId, resultStates.setBy))
    .where(where)
    .orderBy(resultStates.resultId, desc(resultStates.setAt));
  return new Map(rows.map(({ resultId, at, ...rest }) => [resultId, { ...rest, at: at.toISOString() }]));
}

/** Every word on one result, the newest first. */
export async function listStateChanges(tx: Tx, resultId: string): Promise<readonly StateChange[]> {
  const rows = await tx
    .select(COLUMNS)
    .from(resultStates)
    .innerJoin(memberships, eq(memberships.userId, resultStates.setBy))
    .where(eq(resultStates.resultId, resultId))
    .orderBy(desc(resultStates.setAt));
  return rows.map(({ state, comment, at, by }) => ({ state, comment, at: at.toISOString(), by }));
}

export async function insertStates(
  work: Work,
  resultIds: readonly string[],
  state: StateChange['state'],
  comment: string,
): Promise<void> {
  if (resultIds.length === 0) return;
  await work.tx
    .insert(resultStates)
    .values(resultIds.map((resultId) => ({ resultId, state, comment, setBy: work.userId })));
}
