import { differingItems } from '../similarity/condition';
import { sweepIdsOf } from './judged-result';
import type { AdjustmentInput, EvidenceRule, RankingInput, ResultInput } from './ranking-input';

/** A variant's evidence: which results, by which rule. */
export interface EvidenceChoice {
  readonly variantId: string;
  readonly resultIds: readonly string[];
  readonly rule: EvidenceRule;
}

function neededAdjustments(input: RankingInput, results: readonly ResultInput[]): readonly AdjustmentInput[] {
  const items = new Set(
    results.flatMap(({ condition }) => differingItems(input.programme.referenceCondition, condition)),
  );
  return (input.adjustments ?? []).filter(({ item }) => items.has(item));
}

/**
 * The part of a programme's inputs that the evidence of one variant depends on, as an input of the operation `rank` by itself:
 * what is stored with an adoption. The rest of the programme may change without touching it.
 */
export function evidenceInputOf(input: RankingInput, choice: EvidenceChoice): RankingInput {
  const results = input.results.filter(({ id }) => choice.resultIds.includes(id));
  const own = new Set(results.map(({ facilityId }) => facilityId));
  const correlations = (input.correlations ?? []).filter(({ facilityId }) => own.has(facilityId));
  const facilityIds = new Set([
    ...own,
    ...correlations.map(({ referenceFacilityId }) => referenceFacilityId),
    ...(input.programme.referenceFacilityId == null ? [] : [input.programme.referenceFacilityId]),
  ]);
  const modelIds = new Set(results.map(({ modelId }) => modelId));
  const sweepIds = new Set(sweepIdsOf(results));
  return {
    programme: input.programme,
    facilities: input.facilities.filter(({ id }) => facilityIds.has(id)),
    models: (input.models ?? []).filter(({ id }) => modelIds.has(id)),
    variants: input.variants
      .filter(({ id }) => id === choice.variantId)
      .map((variant) => ({ ...variant, evidence: choice.rule })),
    results,
    sweeps: (input.sweeps ?? []).filter(({ id }) => sweepIds.has(id)),
    adjustments: neededAdjustments(input, results),
    correlations,
  };
}
