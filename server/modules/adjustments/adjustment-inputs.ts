import type { Adjustment } from '#shared/contracts/adjustments';
import type { AdjustmentInput } from '#shared/core/ranking/ranking-input';
import type { Tx } from '../../db/pools';
import { inOrderOfUse } from './adjustments.policy';
import { listAdjustments } from './adjustments.repository';

interface ShapedVariant {
  readonly id: string;
  readonly bodyShape: string;
}

/** An adjustment as the method takes it; undefined where no variant of the programme has a shape that it holds for. */
function inputOf(adjustment: Adjustment, variants: readonly ShapedVariant[]): AdjustmentInput | undefined {
  const { id, name, item, fromValue, toValue, deltaDragAreaM2, uM2, perUnitDragAreaM2, uPerUnitM2 } =
    adjustment;
  const { degreesOfFreedom, bodyShapes } = adjustment;
  const variantIds = variants
    .filter(({ bodyShape }) => bodyShapes.some((shape) => shape === bodyShape))
    .map((variant) => variant.id);
  if (bodyShapes.length > 0 && variantIds.length === 0) return undefined;
  return {
    id,
    name,
    item,
    ...(fromValue === undefined ? {} : { fromValue }),
    ...(toValue === undefined ? {} : { toValue }),
    ...(deltaDragAreaM2 === undefined ? {} : { deltaDragAreaM2 }),
    ...(uM2 === undefined ? {} : { uM2 }),
    ...(perUnitDragAreaM2 === undefined ? {} : { perUnitDragAreaM2 }),
    ...(uPerUnitM2 === undefined ? {} : { uPerUnitM2 }),
    ...(degreesOfFreedom === undefined ? {} : { degreesOfFreedom }),
    ...(bodyShapes.length === 0 ? {} : { variantIds }),
  };
}

/** The adjustments in use as the ranking takes them, in the order in which the first that fits is used. */
export async function adjustmentInputs(
  tx: Tx,
  variants: readonly ShapedVariant[],
): Promise<readonly AdjustmentInput[]> {
  const inUse = inOrderOfUse(await listAdjustments(tx)).filter(({ retiredAt }) => retiredAt === undefined);
  return inUse.flatMap((adjustment) => inputOf(adjustment, variants) ?? []);
}
