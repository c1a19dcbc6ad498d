import type { Judgement, JudgementOrder } from '#shared/contracts/judgements';
import type { Result } from '#shared/contracts/results';
import type { Work } from '../../http/context';
import { fail } from '../../http/problem-error';
import { demandFound } from '../../rules/refusals';
import { differences, recordAudit } from '../audit';
import { readEvidenceDocument } from '../rankings';
import { leaveAdoptions } from './adoptions.service';
import { insertJudgements, listJudgements } from './judgements.repository';
import { judgementRefusal, type JudgementRefusal } from './judgements.policy';
import { namedResults } from './named-results';
import { findResult, findResults } from './results.repository';
import { heldResults } from './states.service';

export async function judgementsOfResult(
  work: Work,
  programmeId: string,
  resultId: string,
): Promise<readonly Judgement[]> {
  demandFound(await findResult(work.tx, programmeId, resultId));
  return listJudgements(work.tx, resultId);
}

const sweepIdOf = ({ reynolds }: JudgementOrder): readonly string[] =>
  reynolds.kind === 'sweep-of' ? [reynolds.resultId] : [];

/** @throws {ProblemError} conflict where somebody judged meanwhile, else what the first refusal is, with every one */
function refuseJudgements(refusals: readonly JudgementRefusal[]): void {
  const first = refusals.find(({ kind }) => kind === 'conflict') ?? refusals[0];
  if (first === undefined) return;
  const { kind, ...issue } = first;
  fail(kind, { ...issue, issues: refusals.map(({ kind: _kind, ...each }) => each) });
}

async function refusalsOf(
  work: Work,
  programmeId: string,
  orders: readonly JudgementOrder[],
  results: readonly Result[],
): Promise<readonly JudgementRefusal[]> {
  const sweeps = await findResults(work.tx, programmeId, [...new Set(orders.flatMap(sweepIdOf))]);
  const { inputs } = await readEvidenceDocument(work, programmeId);
  return orders.flatMap((order, position): readonly JudgementRefusal[] => {
    const result = results[position];
    if (result === undefined) return [];
    const [sweepId] = sweepIdOf(order);
    const sweepOf = sweeps.find(({ id }) => id === sweepId);
    const refusal = judgementRefusal(order, { result, sweepOf, inputs });
    return refusal === undefined ? [] : [{ ...refusal, where: `judgements.${position}.${refusal.where}` }];
  });
}

async function auditJudgements(
  work: Work,
  orders: readonly JudgementOrder[],
  results: readonly Result[],
  comment: string | undefined,
): Promise<void> {
  for (const [position, order] of orders.entries()) {
    const { reynolds, includedReason, setAsideReason } = order;
    const before = results[position]?.judgement;
    const held = before && {
      reynolds: before.reynolds,
      includedReason: before.includedReason,
      setAsideReason: before.setAsideReason,
    };
    await recordAudit(work, {
      action: 'result.judged',
      entityKind: 'result',
      entityId: order.resultId,
      summary: [
        ...differences(held ?? {}, { reynolds, includedReason, setAsideReason }),
        ...(comment === undefined ? [] : [{ field: 'comment', after: comment }]),
      ],
    });
  }
}

/**
 * Judges results, each judgement whole; all of them or none. One that is set aside leaves the adoption that holds it.
 *
 * @throws {Refused} what refuses the whole programme
 */
export async function judgeResults(
  work: Work,
  programmeId: string,
  orders: readonly JudgementOrder[],
  comment: string | undefined,
): Promise<readonly (Judgement & { resultId: string })[]> {
  const ids = orders.map(({ resultId }) => resultId);
  const results = await heldResults(work, programmeId, ids);
  refuseJudgements(await refusalsOf(work, programmeId, orders, results));
  await insertJudgements(work, orders, comment);
  await auditJudgements(work, orders, results, comment);
  for (const [position, { setAsideReason }] of orders.entries()) {
    const result = results[position];
    if (setAsideReason === undefined || result === undefined) continue;
    await leaveAdoptions(work, programmeId, [result], `was set aside: ${setAsideReason}`);
  }
  const judged = await namedResults(work, programmeId, ids);
  return judged.flatMap(({ id, judgement }) =>
    judgement === undefined ? [] : [{ ...judgement, resultId: id }],
  );
}
