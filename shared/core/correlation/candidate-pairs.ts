import type { RankingInput, ResultInput } from '../ranking/ranking-input';
import type { ReducedResult } from '../ranking/ranking-output';
import { reduceResults, type RefusedResult } from '../reduction/reduce';
import { byCodeUnits } from '../text-order';
import type { Figure } from '../uncertainty/figure';

/** The steps that a correlation may stand for. */
export type ReplacedStep = 'blockage' | 'reynolds' | 'ground-simulation';

/** Two facilities, and what a correlation of the first to the second stands for. */
export interface PairRequest {
  readonly facilityId: string;
  readonly referenceFacilityId: string;
  readonly replaces: readonly ReplacedStep[];
}

/** One variant measured in both; areas in m² at full scale. */
export interface CandidatePair {
  readonly variantId: string;
  readonly resultId: string;
  readonly referenceResultId: string;
  readonly dragAreaM2: number;
  readonly uM2: number;
  readonly referenceDragAreaM2: number;
  readonly referenceUM2: number;
  /** Of this variant the newest usable result of both. */
  readonly newest: boolean;
  readonly cautions: readonly string[];
  /** Rules by which one of the two would stay out of a ranking. */
  readonly excludedBy: readonly string[];
}

export interface CandidatePairs {
  /** By variant in the order of the input; within a variant usable and newest results first. */
  readonly pairs: readonly CandidatePair[];
  readonly refused: readonly RefusedResult[];
}

/** Of one variant and facility, as many of the newest results as a person would choose among. */
const NEWEST_RESULTS = 3;
const GROUND_ITEMS = ['ground', 'wheels', 'beltSpeedRatio'];

/** The input without what a correlation stands for: no figure may be corrected twice. */
function withoutReplaced(input: RankingInput, replaces: readonly ReplacedStep[]): RankingInput {
  const { programme } = input;
  const reynolds = replaces.includes('reynolds');
  const condition = Object.entries(programme.referenceCondition ?? {}).filter(
    ([item]) => !replaces.includes('ground-simulation') || !GROUND_ITEMS.includes(item),
  );
  return {
    ...input,
    programme: {
      ...programme,
      referenceCondition: Object.fromEntries(condition),
      policies: reynolds
        ? { ...programme.policies, frictionLine: 'off', frictionShare: 0, frictionShareU: 0 }
        : programme.policies,
    },
    facilities: replaces.includes('blockage')
      ? input.facilities.map((facility) => ({ ...facility, blockage: { method: 'none' } }))
      : input.facilities,
    results: reynolds ? input.results.map((result) => ({ ...result, reynoldsMethod: null })) : input.results,
  };
}

interface Side {
  /** By variant, usable results first, the newest first. */
  readonly byVariant: ReadonlyMap<string, readonly ReducedResult[]>;
  readonly refused: readonly RefusedResult[];
}

function newerFirst(one: ResultInput, other: ResultInput): number {
  return (
    byCodeUnits(other.testDate ?? '', one.testDate ?? '') ||
    (other.entrySequence ?? 0) - (one.entrySequence ?? 0) ||
    byCodeUnits(other.id, one.id)
  );
}

/** The results of one facility as they stand before any correlation. */
function sideOf(input: RankingInput, facilityId: string): Side {
  const results = input.results.filter((result) => result.facilityId === facilityId);
  const { reductions, refused } = reduceResults({ ...input, results, correlations: [] });
  const sorted = reductions.toSorted(
    (one, other) =>
      Math.min(one.output.excludedBy.length, 1) - Math.min(other.output.excludedBy.length, 1) ||
      newerFirst(one.parts.result, other.parts.result),
  );
  const byVariant = new Map<string, ReducedResult[]>();
  for (const { output } of sorted) {
    const list = byVariant.get(output.variantId) ?? [];
    if (list.length < NEWEST_RESULTS) byVariant.set(output.variantId, [...list, output]);
  }
  return { byVariant, refused };
}

/** The figure's u without the bias of the facility that it comes from: that one is what the correlation is about. */
function uWithoutBias({ contributions }: Figure, facilityId: string): number {
  const bias = [`facility-bias:${facilityId}`, `simulation-bias:${facilityId}`];
  const variance = contributions
    .filter(({ key }) => !bias.includes(key))
    .reduce((sum, { amountM2 }) => sum + amountM2 * amountM2, 0);
  return Math.sqrt(variance);
}

/**
 * Pairs that a correlation of one facility to another could rest on: one variant with a result in each, both reduced as the
 * programme reduces them but before the correlation (method section 8), the first facility's without the steps that the
 * correlation stands for. A facility has no pairs with itself.
 *
 * @throws {Refused} as `reduceResults`
 */
export function candidatePairs(input: RankingInput, request: PairRequest): CandidatePairs {
  const { facilityId, referenceFacilityId, replaces } = request;
  if (facilityId === referenceFacilityId) return { pairs: [], refused: [] };
  const side = sideOf(withoutReplaced(input, replaces), facilityId);
  const reference = sideOf(input, referenceFacilityId);
  const pairs = input.variants.flatMap(({ id: variantId }) =>
    (side.byVariant.get(variantId) ?? []).flatMap((one, i) =>
      (reference.byVariant.get(variantId) ?? []).map((other, j): CandidatePair => {
        const excludedBy = [...new Set([...one.excludedBy, ...other.excludedBy])];
        return {
          variantId,
          resultId: one.resultId,
          referenceResultId: other.resultId,
          dragAreaM2: one.zeroYaw.dragAreaM2,
          uM2: uWithoutBias(one.zeroYaw, facilityId),
          referenceDragAreaM2: other.zeroYaw.dragAreaM2,
          referenceUM2: uWithoutBias(other.zeroYaw, referenceFacilityId),
          newest: i === 0 && j === 0 && excludedBy.length === 0,
          cautions: [...new Set([...one.cautions, ...other.cautions])].sort(),
          excludedBy,
        };
      }),
    ),
  );
  return { pairs, refused: [...side.refused, ...reference.refused] };
}
