import { amount, type Amount } from '../uncertainty/budget';
import { blockageAmount, frontalAreaThroughBlockage } from './blockage';
import { notCorrectedHere } from './reduce-point';
import type { ReducedPoint, ResultParts } from './reduction';
import { needed } from './result-parts';
import { asBuiltScaleAmount } from './scale';

/** Amount of an area that is not known exactly, where the result is a coefficient: CdA/A_q·u(A_q), through the blockage step. */
function pushStatedArea(
  into: Amount[],
  { result }: ResultParts,
  { uncorrectedDragAreaM2, blockage }: ReducedPoint,
  weight: number,
): void {
  const { quantity, quotedAreaM2, quotedAreaUM2, id } = result;
  if (quantity !== 'coefficient' || quotedAreaM2 == null || quotedAreaUM2 == null) return;
  const amountM2 = ((uncorrectedDragAreaM2 * quotedAreaUM2) / quotedAreaM2) * blockage.derivative;
  into.push(amount(`stated-area:${id}`, amountM2 * weight));
}

function pushBlockage(into: Amount[], parts: ResultParts, point: ReducedPoint, weight: number): void {
  const { tunnel, facility, variant, scale } = parts;
  if (tunnel === null || notCorrectedHere(parts)) return;
  const method = needed(facility.blockage, 'facility.blockage');
  const byMethod = blockageAmount(method, point.uncorrectedDragAreaM2, point.dragAreaM2);
  const throughArea = frontalAreaThroughBlockage(
    method,
    point.dragAreaM2,
    scale,
    variant.frontalAreaUM2 ?? 0,
    tunnel.blockageRatio,
    tunnel.areaM2,
  );
  if (byMethod !== 0) into.push(amount(`blockage-method:${facility.id}`, byMethod * weight));
  if (throughArea !== 0) into.push(amount(`frontal-area:${variant.id}`, throughArea * weight));
}

function pushScale(into: Amount[], { model, scale }: ResultParts, dragAreaM2: number, weight: number): void {
  if (model === null) return;
  const amountM2 = asBuiltScaleAmount(dragAreaM2, scale, model.scaleU ?? 0);
  if (amountM2 !== 0) into.push(amount(`as-built-scale:${model.id}`, amountM2 * weight));
}

/**
 * What the steps to the full-scale drag area add, all but repeatability, whose amounts the points do not share: every amount of
 * a point times its weight; null: their mean [m²].
 */
export function correctionAmounts(
  parts: ResultParts,
  points: readonly ReducedPoint[],
  weights: readonly number[] | null,
): Amount[] {
  const amounts: Amount[] = [];
  for (let i = 0; i < points.length; i++) {
    const point = points[i] as ReducedPoint;
    const weight = weights === null ? 1 / points.length : (weights[i] ?? NaN);
    pushStatedArea(amounts, parts, point, weight);
    pushBlockage(amounts, parts, point, weight);
    pushScale(amounts, parts, point.dragAreaM2, weight);
  }
  return amounts;
}
