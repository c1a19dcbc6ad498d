import type { ConditionInput } from '../ranking/ranking-input';

/** What a correlation that replaces ground simulation skips (method section 8). */
export const GROUND_SIMULATION_ITEMS: ReadonlySet<string> = new Set(['ground', 'wheels', 'beltSpeedRatio']);

/**
 * The items of the reference condition in which a result differs. Values match exactly; an item that the result does not
 * state counts as different; items that only the result states are not compared (method section 8).
 */
export function differingItems(
  reference: ConditionInput | null | undefined,
  condition: ConditionInput | null | undefined,
): string[] {
  const differing: string[] = [];
  for (const item in reference) {
    const value = reference[item];
    if (value != null && condition?.[item] !== value) differing.push(item);
  }
  return differing;
}
