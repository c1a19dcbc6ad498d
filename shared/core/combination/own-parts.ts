import { AMOUNT_FLOOR_M2 } from '../constants';
import { byCodeUnits } from '../text-order';
import type { KeyedFigure } from '../uncertainty/budget';

/** What several figures hold in common, and what each holds by itself. */
export interface OwnParts {
  /** Keys with a common part, sorted (code units). */
  readonly sharedKeys: readonly string[];
  /** One a figure: root of the sum of squares of its own amounts [m²]; below 1e-15 it counts as 0. */
  readonly ownUncertaintyM2: readonly number[];
}

/** The signed amount smallest in magnitude, where all have one sign; else 0. */
function commonPart(amounts: readonly number[]): number {
  const sign = Math.sign(amounts[0] ?? 0);
  if (amounts.some((amountM2) => Math.sign(amountM2) !== sign)) return 0;
  return sign * Math.min(...amounts.map(Math.abs));
}

/**
 * Splits the amounts of two or more figures: under a key that all hold with one sign the amount smallest in magnitude is common and the
 * excess is the figure's own; under every other key all is its own (method section 10).
 */
export function ownPartsOf(figures: readonly KeyedFigure[]): OwnParts {
  const byKey = new Map<string, number[]>();
  for (const { budget } of figures) {
    for (const { key, amountM2 } of budget) byKey.set(key, [...(byKey.get(key) ?? []), amountM2]);
  }
  const common = new Map<string, number>();
  for (const [key, amounts] of byKey) {
    const part = amounts.length === figures.length ? commonPart(amounts) : 0;
    if (part !== 0) common.set(key, part);
  }
  const ownUncertaintyM2 = figures.map(({ budget }) => {
    const u = Math.hypot(...budget.map(({ key, amountM2 }) => amountM2 - (common.get(key) ?? 0)));
    return u < AMOUNT_FLOOR_M2 ? 0 : u;
  });
  return { sharedKeys: [...common.keys()].sort(byCodeUnits), ownUncertaintyM2 };
}
