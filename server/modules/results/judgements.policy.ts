import type { JudgementOrder } from '#shared/contracts/judgements';
import type { Result } from '#shared/contracts/results';
import { judgedResult } from '#shared/core/ranking/judged-result';
import type { RankingInput, ResultInput } from '#shared/core/ranking/ranking-input';
import { withSweeps } from '#shared/core/ranking/sweeps';
import { reduceResults } from '#shared/core/reduction/reduce';
import type { Issue } from '../../rules/issue';

export interface JudgementRefusal extends Issue {
  readonly kind: 'conflict' | 'wrong-state' | 'unusable-input';
}

type Known = Pick<Result, 'id' | 'name' | 'variantId' | 'withdrawn' | 'judgement'>;

/** What the judgement of one result is weighed with. */
export interface JudgementSurroundings {
  readonly result: Known;
  /** The result whose sweep is asked for, where the programme has it. */
  readonly sweepOf: Known | undefined;
  /** All results of the programme as the method takes them. */
  readonly inputs: RankingInput;
}

const conflict = (result: Known): JudgementRefusal => ({
  kind: 'conflict',
  where: 'expectedJudgementId',
  detail: `${result.judgement === undefined ? 'The judgement' : `${result.judgement.by} judged`} ${result.name} since you looked. Look again, then decide.`,
});

function isHeldAlready({ reynolds, includedReason, setAsideReason }: JudgementOrder, result: Known): boolean {
  const held = result.judgement;
  return (
    held !== undefined &&
    JSON.stringify(held.reynolds) === JSON.stringify(reynolds) &&
    held.includedReason === includedReason &&
    held.setAsideReason === setAsideReason
  );
}

function stateRefusal(order: JudgementOrder, result: Known): JudgementRefusal | undefined {
  if (order.expectedJudgementId !== result.judgement?.id) return conflict(result);
  if (result.withdrawn !== undefined) {
    return {
      kind: 'wrong-state',
      where: 'resultId',
      detail: `${result.name} was withdrawn: nothing is judged about it any more.`,
    };
  }
  return isHeldAlready(order, result)
    ? { kind: 'wrong-state', where: 'resultId', detail: `This is held of ${result.name} already.` }
    : undefined;
}

const unusable = (where: string, detail: string, reason?: string): JudgementRefusal => ({
  kind: 'unusable-input',
  where,
  detail,
  ...(reason === undefined ? {} : { reason }),
});

function sweepRefusal(
  { reynolds }: JudgementOrder,
  { result, sweepOf }: JudgementSurroundings,
): JudgementRefusal | undefined {
  if (reynolds.kind !== 'sweep-of') return undefined;
  const where = 'reynolds.resultId';
  if (sweepOf === undefined) return unusable(where, 'There is no such result in this programme.');
  if (sweepOf.id === result.id) {
    return unusable(where, `${result.name} would use its own points: choose its own sweep instead.`);
  }
  if (sweepOf.withdrawn !== undefined) {
    return unusable(where, `${sweepOf.name} was withdrawn. Choose a sweep that stands.`);
  }
  return sweepOf.variantId === result.variantId
    ? undefined
    : unusable(
        where,
        `${sweepOf.name} is a sweep of another variant, and a sweep says something about its own shape only. Choose one of this variant.`,
      );
}

/** The refusal of one result by the method, where it refuses it; and what keeps it out, where it does not. */
function reducedAs(
  inputs: RankingInput,
  result: ResultInput,
): { readonly code?: string; readonly detail?: string; readonly excludedBy: readonly string[] } {
  const { reductions, refused } = reduceResults(withSweeps({ ...inputs, results: [result] }, inputs.results));
  const [refusal] = refused;
  if (refusal !== undefined) return { code: refusal.code, detail: refusal.detail, excludedBy: [] };
  return { excludedBy: reductions[0]?.output.excludedBy ?? [] };
}

/** What the method itself says about a judgement: it must not make a result unusable, nor include what is comparable. */
function methodRefusal(
  order: JudgementOrder,
  { result, inputs }: JudgementSurroundings,
): JudgementRefusal | undefined {
  const before = inputs.results.find(({ id }) => id === result.id);
  if (before === undefined) return undefined;
  const { reynolds, includedReason } = order;
  const after = reducedAs(inputs, judgedResult(before, { reynolds, includedReason }));
  if (after.code !== undefined) {
    const was = reducedAs(inputs, before).code;
    return was === after.code ? undefined : unusable('reynolds', after.detail ?? after.code, after.code);
  }
  const includesAnew = includedReason !== undefined && includedReason !== result.judgement?.includedReason;
  if (!includesAnew) return undefined;
  const plain = reducedAs(inputs, judgedResult(before, { reynolds }));
  return plain.excludedBy.includes('not-comparable')
    ? undefined
    : unusable(
        'includedReason',
        `${result.name} is comparable as it stands and counts already: there is nothing to include.`,
        'comparable',
      );
}

/** Why a result cannot be judged so, or undefined where it can. @throws {Refused} what refuses the whole programme */
export function judgementRefusal(
  order: JudgementOrder,
  surroundings: JudgementSurroundings,
): JudgementRefusal | undefined {
  return (
    stateRefusal(order, surroundings.result) ??
    sweepRefusal(order, surroundings) ??
    methodRefusal(order, surroundings)
  );
}
