import type { ReducedSet } from '../reduction/reduce';
import { exclusionRules } from '../reduction/reduce';
import type { Reduction } from '../reduction/reduction';
import { byCodeUnits } from '../text-order';
import type { KeyedFigure } from '../uncertainty/budget';
import type { Basis, EvidenceRule, VariantInput } from './ranking-input';
import type { VariantWithoutEvidence } from './ranking-output';

/** What a variant is ranked by: its figure on a basis, and the zero-yaw one that energy uses. */
export interface VariantEvidence {
  readonly variant: VariantInput;
  readonly evidence: EvidenceRule;
  /** Used results, oldest first. */
  readonly resultIds: readonly string[];
  readonly figure: KeyedFigure;
  readonly zeroYaw: KeyedFigure;
}

export interface PickedEvidence {
  /** In the order of the variants. */
  readonly chosen: readonly VariantEvidence[];
  /** By variant id. */
  readonly variantsWithoutEvidence: readonly VariantWithoutEvidence[];
}

/** By test date, then entry, then id (method section 10). */
function byAge({ parts: { result: a } }: Reduction, { parts: { result: b } }: Reduction): number {
  return (
    byCodeUnits(a.testDate ?? '', b.testDate ?? '') ||
    (a.entrySequence ?? 0) - (b.entrySequence ?? 0) ||
    byCodeUnits(a.id, b.id)
  );
}

function figureOn(basis: Basis, reduction: Reduction): KeyedFigure | null {
  return basis === 'wind-averaged' ? reduction.windAverage.figure : reduction.zeroYaw;
}

function newestByVariant(reduced: ReducedSet, basis: Basis): ReadonlyMap<string, Reduction> {
  const newest = new Map<string, Reduction>();
  for (const reduction of reduced.reductions) {
    if (exclusionRules(reduction, basis).length > 0) continue;
    const { variantId } = reduction.output;
    const before = newest.get(variantId);
    if (before === undefined || byAge(before, reduction) < 0) newest.set(variantId, reduction);
  }
  return newest;
}

/** The newest usable result of every variant; variants without one are said. */
export function pickEvidence(
  variants: readonly VariantInput[],
  reduced: ReducedSet,
  basis: Basis,
): PickedEvidence {
  const newest = newestByVariant(reduced, basis);
  const chosen: VariantEvidence[] = [];
  const without: string[] = [];
  for (const variant of variants) {
    const reduction = newest.get(variant.id);
    const figure = reduction === undefined ? null : figureOn(basis, reduction);
    if (reduction === undefined || figure === null) {
      without.push(variant.id);
      continue;
    }
    chosen.push({
      variant,
      evidence: 'newest',
      resultIds: [reduction.output.resultId],
      figure,
      zeroYaw: reduction.zeroYaw,
    });
  }
  return {
    chosen,
    variantsWithoutEvidence: without
      .sort(byCodeUnits)
      .map((variantId) => ({ variantId, rule: 'no-usable-evidence' })),
  };
}
