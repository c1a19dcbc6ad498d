import type { Reduction, ReductionContext } from '../reduction/reduction';
import { check, type Check, type CheckFinding, type CheckVerdict, type DifferingItem } from './check';

function itemsOf(
  names: readonly string[],
  { parts }: Reduction,
  { referenceCondition }: ReductionContext,
): DifferingItem[] {
  return names.flatMap((item) => {
    const reference = referenceCondition[item];
    return reference == null ? [] : [{ item, reference, stated: parts.result.condition?.[item] ?? null }];
  });
}

/**
 * Whether the test condition is the programme's reference (method section 8): it passes where nothing differs or adjustments
 * have brought it there, is a caution where somebody included it with a reason, and else keeps the result out. Items that a
 * correlation stands for are not compared.
 */
export function conditionCheck(reduction: Reduction, context: ReductionContext): Check {
  const { applied, notComparable, includedReason } = reduction.condition;
  const told = (verdict: CheckVerdict, finding: CheckFinding | null, names: readonly string[]): Check =>
    check({ check: 'condition', verdict, finding, items: itemsOf(names, reduction, context) });
  if (notComparable.length > 0) {
    return includedReason === null
      ? told('excluded', null, notComparable)
      : told('caution', 'included-with-reason', notComparable);
  }
  const adjusted = applied.map(({ item }) => item);
  return told('passes', adjusted.length > 0 ? 'adjusted' : null, adjusted);
}
