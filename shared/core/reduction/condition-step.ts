import { effectOf } from '../similarity/adjustment';
import { differingItems, GROUND_SIMULATION_ITEMS } from '../similarity/condition';
import { amount, type Amount } from '../uncertainty/budget';
import type { AppliedAdjustment, ConditionStep, ReductionContext, ResultParts } from './reduction';

/** The first of the organisation's adjustments that fits the difference, or none. */
function adjustmentFor(
  item: string,
  { result, variant }: ResultParts,
  { adjustments, referenceCondition }: ReductionContext,
): AppliedAdjustment | null {
  const stated = result.condition?.[item];
  const reference = referenceCondition[item];
  if (stated == null || reference == null) return null;
  for (const adjustment of adjustments.get(item) ?? []) {
    if (adjustment.variantIds != null && !adjustment.variantIds.includes(variant.id)) continue;
    const effect = effectOf(adjustment, stated, reference);
    if (effect !== null) return { adjustment, item, stated, reference, ...effect };
  }
  return null;
}

function reasonOf({ result }: ResultParts): string | null {
  const reason = result.includedWithReason?.trim() ?? '';
  return reason === '' ? null : reason;
}

const NOTHING: ConditionStep = { applied: [], notComparable: [], includedReason: null };

/**
 * Compares the condition of a result with the programme's reference, item by item, and finds the adjustments for what differs.
 * What no adjustment covers makes it not comparable, unless somebody includes it with a written reason (method section 8).
 */
export function conditionStepOf(parts: ResultParts, context: ReductionContext): ConditionStep {
  const differing = differingItems(context.referenceCondition, parts.result.condition);
  if (differing.length === 0) return NOTHING;
  const applied: AppliedAdjustment[] = [];
  const notComparable: string[] = [];
  for (const item of differing) {
    if (parts.replaced.groundSimulation && GROUND_SIMULATION_ITEMS.has(item)) continue;
    const found = adjustmentFor(item, parts, context);
    if (found === null) notComparable.push(item);
    else applied.push(found);
  }
  return { applied, notComparable, includedReason: notComparable.length === 0 ? null : reasonOf(parts) };
}

/** The amounts of the adjustments [m²], signed. */
export function conditionAmounts({ applied }: ConditionStep): Amount[] {
  return applied.map(({ adjustment, amountM2 }) =>
    amount(`adjustment:${adjustment.id}`, amountM2, adjustment.degreesOfFreedom),
  );
}
