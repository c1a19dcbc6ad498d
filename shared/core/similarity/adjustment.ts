import type { AdjustmentInput, ConditionValue } from '../ranking/ranking-input';

/** What an adjustment does to one difference of the condition [m²], and its signed uncertainty. */
export interface AdjustmentEffect {
  readonly direction: 'forwards' | 'backwards' | 'per-unit';
  readonly deltaM2: number;
  readonly amountM2: number;
}

/**
 * What an adjustment adds to a result tested with a stated value, to bring it to the reference; null where it does not fit.
 * Categorical ones name from and to and are used backwards with the sign turned; numeric ones are per unit, times
 * (reference − test) (method section 8).
 */
export function effectOf(
  adjustment: AdjustmentInput,
  stated: ConditionValue,
  reference: ConditionValue,
): AdjustmentEffect | null {
  const { fromValue, toValue, deltaDragAreaM2, uM2, perUnitDragAreaM2, uPerUnitM2 } = adjustment;
  if (deltaDragAreaM2 != null) {
    if (fromValue === stated && toValue === reference) {
      return { direction: 'forwards', deltaM2: deltaDragAreaM2, amountM2: uM2 ?? 0 };
    }
    if (fromValue === reference && toValue === stated) {
      return { direction: 'backwards', deltaM2: -deltaDragAreaM2, amountM2: -(uM2 ?? 0) };
    }
  }
  if (perUnitDragAreaM2 != null && typeof stated === 'number' && typeof reference === 'number') {
    const distance = reference - stated;
    return {
      direction: 'per-unit',
      deltaM2: perUnitDragAreaM2 * distance,
      amountM2: (uPerUnitM2 ?? 0) * distance,
    };
  }
  return null;
}
