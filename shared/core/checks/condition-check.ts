import type { Reduction, ReductionContext } from '../reduction/reduction';
import { differingItems } from '../similarity/condition';
import { check, type Check, type CheckFinding, type CheckVerdict, type DifferingItem } from './check';

function itemsOf({ parts }: Reduction, { referenceCondition }: ReductionContext): DifferingItem[] {
  const { condition } = parts.result;
  return differingItems(referenceCondition, condition).flatMap((item) => {
    const reference = referenceCondition[item];
    return reference == null ? [] : [{ item, reference, stated: condition?.[item] ?? null }];
  });
}

/**
 * Whether the test condition is the programme's reference (method section 8): it passes where nothing differs or adjustments
 * have brought it there, is a caution where somebody included it with a reason, and else keeps the result out.
 */
export function conditionCheck(reduction: Reduction, context: ReductionContext): Check {
  const items = itemsOf(reduction, context);
  const { excludedBy, cautions } = reduction.output;
  const told = (verdict: CheckVerdict, finding: CheckFinding | null): Check =>
    check({ check: 'condition', verdict, finding, items });
  if (excludedBy.includes('not-comparable')) return told('excluded', null);
  if (cautions.includes('included-with-reason')) return told('caution', 'included-with-reason');
  return told('passes', items.length > 0 ? 'adjusted' : null);
}
