import { type JudgementFields, type JudgementOrder, UNJUDGED } from '#shared/contracts/judgements';
import type { Result } from '#shared/contracts/results';
import { usualReynolds } from '#shared/core/ranking/judged-result';
import type { ResultInput } from '#shared/core/ranking/ranking-input';

/** What holds of a result now: what somebody judged, else what usually holds. */
export function heldOf(result: Pick<Result, 'judgement'>, input: ResultInput | undefined): JudgementFields {
  if (result.judgement === undefined) {
    return input === undefined ? UNJUDGED : { reynolds: usualReynolds(input) };
  }
  const { reynolds, includedReason, setAsideReason } = result.judgement;
  return { reynolds, includedReason, setAsideReason };
}

/** What holds now with some of it changed, as the server is to hold it. */
export function judgementOrder(
  result: Pick<Result, 'id' | 'judgement'>,
  input: ResultInput | undefined,
  changes: Partial<JudgementFields>,
): JudgementOrder {
  const { reynolds, includedReason, setAsideReason } = { ...heldOf(result, input), ...changes };
  return {
    resultId: result.id,
    reynolds,
    includedReason,
    setAsideReason,
    expectedJudgementId: result.judgement?.id,
  };
}
