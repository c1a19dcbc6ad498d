import {
  type CheckLimits,
  DEFAULT_LIMITS,
  DEFAULT_LIMITS_NUMBER,
  policiesInputOf,
} from '#shared/core/checks/limits';
import { candidatePairs, type CandidatePair } from '#shared/core/correlation/candidate-pairs';
import { judgedResult, type ResultJudgement } from '#shared/core/ranking/judged-result';
import type {
  AdjustmentInput,
  CorrelationInput,
  PoliciesInput,
  RankingInput,
  ResultInput,
} from '#shared/core/ranking/ranking-input';
import { withSweeps } from '#shared/core/ranking/sweeps';
import type { Scenario } from './scenario-types';

/** The limits in force at the end of the scenario. */
export function policiesOf({ policies, programme }: Scenario): PoliciesInput {
  const values = policies.reduce<CheckLimits>(
    (limits, { changes }) => ({ ...limits, ...changes }),
    DEFAULT_LIMITS,
  );
  return policiesInputOf(values, DEFAULT_LIMITS_NUMBER + policies.length, programme.frictionLine ?? 'on');
}

/** Adjustments that name body shapes go before those that hold for every shape, as in the product. */
export function adjustmentsOf({ adjustments, variants }: Scenario): readonly AdjustmentInput[] {
  return Object.entries(adjustments).map(([id, fields]) => {
    const { bodyShapes, evidence: _evidence, attachmentId: _attachment, ...worth } = fields;
    const variantIds = Object.entries(variants).flatMap(([key, { bodyShape }]) =>
      bodyShapes.includes(bodyShape) ? [key] : [],
    );
    return { ...worth, id, ...(bodyShapes.length === 0 ? {} : { variantIds }) };
  });
}

/** Results as they are judged at the end of the scenario; those set aside are left out. */
export function judgedResults(
  results: readonly ResultInput[],
  { judgements }: Scenario,
): readonly ResultInput[] {
  const judged = new Map(judgements.map((judgement) => [judgement.result, judgement]));
  return results.flatMap((result) => {
    const { reynolds, includedReason, setAsideReason } = judged.get(result.id) ?? {};
    if (setAsideReason !== undefined) return [];
    const plain = judgedResult(result, undefined);
    if (reynolds === undefined) return [{ ...plain, includedWithReason: includedReason }];
    const judgement: ResultJudgement = {
      reynolds: { kind: 'sweep-of', resultId: reynolds.sweepOf },
      includedReason,
    };
    return [judgedResult(result, judgement)];
  });
}

/** The pair that two results make, as the product proposes it. */
export function pairOf(
  input: RankingInput,
  facilityId: string,
  referenceFacilityId: string,
  [result, reference]: readonly [string, string],
): CandidatePair {
  const results = input.results.filter(({ id }) => id === result || id === reference);
  const request = { facilityId, referenceFacilityId, replaces: [] };
  const [pair] = candidatePairs({ ...input, results }, request).pairs;
  if (pair === undefined) throw new Error(`${result} and ${reference} make no pair`);
  return pair;
}

/** The newest version of each correlation. */
function correlationsOf(input: RankingInput, { correlations }: Scenario): readonly CorrelationInput[] {
  return Object.entries(correlations).map(([id, { facility, referenceFacility, versions }]) => ({
    id,
    facilityId: facility,
    referenceFacilityId: referenceFacility,
    replaces: [],
    pairs: (versions.at(-1)?.pairs ?? []).map((names) => {
      const { dragAreaM2, uM2, referenceDragAreaM2, referenceUM2 } = pairOf(
        input,
        facility,
        referenceFacility,
        names,
      );
      return { dragAreaM2, uM2, referenceDragAreaM2, referenceUM2 };
    }),
  }));
}

/** An input with everything that was judged: what results are moved by, adjusted by, correlated by. */
export function withJudgement(input: RankingInput, all: RankingInput, scenario: Scenario): RankingInput {
  return withSweeps({ ...input, correlations: correlationsOf(all, scenario) }, all.results);
}
