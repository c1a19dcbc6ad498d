import { combine, type Combination } from '../combination/combination';
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
  /** Of the same results. */
  readonly zeroYaw: KeyedFigure;
  /** How the results of a weighted mean agree on the basis, in the order of `resultIds`; null for the newest result. */
  readonly combination: Combination | null;
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

/** A result that may be used on a basis, with its figure there. */
interface Usable {
  readonly reduction: Reduction;
  readonly figure: KeyedFigure;
}

function figureOn(basis: Basis, reduction: Reduction): KeyedFigure | null {
  return basis === 'wind-averaged' ? reduction.windAverage.figure : reduction.zeroYaw;
}

/** The usable results of every variant, in the order of the reductions. */
function usableByVariant(reduced: ReducedSet, basis: Basis): ReadonlyMap<string, readonly Usable[]> {
  const usable = new Map<string, Usable[]>();
  for (const reduction of reduced.reductions) {
    const figure = figureOn(basis, reduction);
    if (figure === null || exclusionRules(reduction, basis).length > 0) continue;
    const { variantId } = reduction.output;
    const before = usable.get(variantId);
    if (before === undefined) usable.set(variantId, [{ reduction, figure }]);
    else before.push({ reduction, figure });
  }
  return usable;
}

function newestOf(variant: VariantInput, usable: readonly Usable[]): VariantEvidence | null {
  const [first, ...others] = usable;
  if (first === undefined) return null;
  const { reduction, figure } = others.reduce(
    (newest, one) => (byAge(newest.reduction, one.reduction) < 0 ? one : newest),
    first,
  );
  return {
    variant,
    evidence: 'newest',
    resultIds: [reduction.output.resultId],
    figure,
    zeroYaw: reduction.zeroYaw,
    combination: null,
  };
}

/** @throws {Refused} uncertainty-zero */
function weightedMeanOf(
  variant: VariantInput,
  usable: readonly Usable[],
  basis: Basis,
): VariantEvidence | null {
  if (usable.length === 0) return null;
  const oldestFirst = [...usable].sort((a, b) => byAge(a.reduction, b.reduction));
  const where = `variant:${variant.id}.results`;
  const combination = combine(
    oldestFirst.map(({ figure }) => figure),
    variant.id,
    where,
  );
  const zeroYaw =
    basis === 'zero-yaw'
      ? combination.figure
      : combine(
          oldestFirst.map(({ reduction }) => reduction.zeroYaw),
          variant.id,
          where,
        ).figure;
  return {
    variant,
    evidence: 'weighted-mean',
    resultIds: oldestFirst.map(({ reduction }) => reduction.output.resultId),
    figure: combination.figure,
    zeroYaw,
    combination,
  };
}

/**
 * The newest usable result of every variant, or the weighted mean of all its usable ones; variants without any are said.
 *
 * @throws {Refused} uncertainty-zero: a result without an uncertainty of its own in a weighted mean
 */
export function pickEvidence(
  variants: readonly VariantInput[],
  reduced: ReducedSet,
  basis: Basis,
): PickedEvidence {
  const usable = usableByVariant(reduced, basis);
  const chosen: VariantEvidence[] = [];
  const without: string[] = [];
  for (const variant of variants) {
    const results = usable.get(variant.id) ?? [];
    const evidence =
      variant.evidence === 'weighted-mean'
        ? weightedMeanOf(variant, results, basis)
        : newestOf(variant, results);
    if (evidence === null) without.push(variant.id);
    else chosen.push(evidence);
  }
  return {
    chosen,
    variantsWithoutEvidence: without
      .sort(byCodeUnits)
      .map((variantId) => ({ variantId, rule: 'no-usable-evidence' })),
  };
}
