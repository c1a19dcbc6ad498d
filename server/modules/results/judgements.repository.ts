import { desc, eq, type SQL } from 'drizzle-orm';
import type { Judgement, JudgementFields } from '#shared/contracts/judgements';
import type { Work } from '../../http/context';
import type { Tx } from '../../db/pools';
import { memberships } from '../../db/tables/organisations';
import { resultJudgements, results } from '../../db/tables/results';
import { withoutNulls } from '../../db/without-nulls';

const COLUMNS = {
  resultId: resultJudgements.resultId,
  id: resultJudgements.id,
  reynolds: resultJudgements.reynolds,
  includedReason: resultJudgements.includedReason,
  setAsideReason: resultJudgements.setAsideReason,
  comment: resultJudgements.comment,
  at: resultJudgements.judgedAt,
  by: memberships.displayName,
};

interface Row {
  readonly resultId: string;
  readonly id: string;
  readonly reynolds: JudgementFields['reynolds'];
  readonly includedReason: string | null;
  readonly setAsideReason: string | null;
  readonly comment: string | null;
  readonly at: Date;
  readonly by: string;
}

function judgementOf({ resultId: _resultId, at, ...row }: Row): Judgement {
  return { ...withoutNulls(row), at: at.toISOString() };
}

/** What holds of each of the results that a condition picks; those that nobody judged are missing. */
export async function judgementsOf(tx: Tx, where: SQL | undefined): Promise<ReadonlyMap<string, Judgement>> {
  const rows = await tx
    .selectDistinctOn([resultJudgements.resultId], COLUMNS)
    .from(resultJudgements)
    .innerJoin(results, eq(results.id, resultJudgements.resultId))
    .innerJoin(memberships, eq(memberships.userId, resultJudgements.judgedBy))
    .where(where)
    .orderBy(resultJudgements.resultId, desc(resultJudgements.judgedAt));
  return new Map(rows.map((row) => [row.resultId, judgementOf(row)]));
}

/** Everything that was held of one result, the newest first. */
export async function listJudgements(tx: Tx, resultId: string): Promise<readonly Judgement[]> {
  const rows = await tx
    .select(COLUMNS)
    .from(resultJudgements)
    .innerJoin(memberships, eq(memberships.userId, resultJudgements.judgedBy))
    .where(eq(resultJudgements.resultId, resultId))
    .orderBy(desc(resultJudgements.judgedAt));
  return rows.map(judgementOf);
}

export interface JudgementToStore extends JudgementFields {
  readonly resultId: string;
}

/** Writes judgements, each whole. */
export async function insertJudgements(
  work: Work,
  judgements: readonly JudgementToStore[],
  comment: string | undefined,
): Promise<void> {
  await work.tx.insert(resultJudgements).values(
    judgements.map(({ resultId, reynolds, includedReason, setAsideReason }) => ({
      resultId,
      reynolds,
      includedReason: includedReason ?? null,
      setAsideReason: setAsideReason ?? null,
      comment: comment ?? null,
      judgedBy: work.userId,
    })),
  );
}
