import type { PointInput } from '../ranking/ranking-input';
import { machNumber, reynoldsNumber } from '../similarity/flow';
import { correctForBlockage, type BlockageCorrection } from './blockage';
import { measuredDragArea, pointFlow } from './measured-value';
import type { PointConditions, ReducedPoint, ReductionContext, ResultParts } from './reduction';
import { repeatabilityOf } from './repeatability';
import { needed } from './result-parts';
import { fullScaleDragArea } from './scale';

/** The source has corrected, or the correlation stands for the correction. */
export const notCorrectedHere = ({ result, replaced }: ResultParts): boolean =>
  result.blockageAlreadyCorrectedBy != null || replaced.blockage;

/** The blockage step of a point; outside tunnels, where the source has corrected or a correlation replaces it there is none. */
function blockageStep(modelDragAreaM2: number, parts: ResultParts): BlockageCorrection {
  const { tunnel, facility } = parts;
  if (tunnel === null || notCorrectedHere(parts)) return { modelDragAreaM2, derivative: 1 };
  const method = needed(facility.blockage, 'facility.blockage');
  return correctForBlockage(method, modelDragAreaM2, tunnel.blockageRatio, tunnel.areaM2);
}

/** Speed, Mach and Reynolds number of a point. @throws {Refused} missing-input, not-positive */
function conditionsOf(point: PointInput, parts: ResultParts, context: ReductionContext): PointConditions {
  const { air, scale } = parts;
  const flow = pointFlow(point, parts);
  const { speedMs } = flow;
  if (air === null || speedMs === null) return { flow, mach: null, reynolds: null };
  const { characteristicLengthM } = context.programme;
  return {
    flow,
    mach: machNumber(speedMs, air.speedOfSoundMs),
    reynolds: reynoldsNumber(speedMs, characteristicLengthM, scale, air.kinematicViscosityM2S),
  };
}

/**
 * One point through the steps dynamic pressure, coefficient, blockage and full-scale drag area (method sections 2, 3 and 5),
 * at its own speed.
 *
 * @throws {Refused} the codes of these steps, and repeatability-needs-two
 */
function pointIn(conditions: PointConditions, point: PointInput, parts: ResultParts): ReducedPoint {
  const { scale } = parts;
  const { flow, mach, reynolds } = conditions;
  const measuredArea = measuredDragArea(point, parts, flow);
  const blockage = blockageStep(measuredArea.modelDragAreaM2, parts);
  const dragAreaM2 = fullScaleDragArea(blockage.modelDragAreaM2, scale);
  const perValue = fullScaleDragArea(measuredArea.perValue, scale) * blockage.derivative;
  return {
    yawDeg: point.yawDeg ?? 0,
    value: needed(point.value, 'points.value'),
    netForceN: measuredArea.netForceN,
    flow,
    mach,
    reynolds,
    modelDragAreaM2: measuredArea.modelDragAreaM2,
    blockage,
    uncorrectedDragAreaM2: fullScaleDragArea(measuredArea.modelDragAreaM2, scale),
    dragAreaM2,
    perValue,
    repeatability: repeatabilityOf(point, parts, perValue, dragAreaM2),
  };
}

/**
 * All points of a result, each on its own at its own speed.
 *
 * @throws {Refused} the codes of dynamic pressure, coefficient, blockage and scale, and repeatability-needs-two
 */
export function reducePoints(
  given: readonly PointInput[],
  parts: ResultParts,
  context: ReductionContext,
): readonly ReducedPoint[] {
  const points: ReducedPoint[] = [];
  let shared: PointConditions | null = null;
  for (const point of given) {
    const own = point.speedKmh != null || point.dynamicPressurePa != null;
    const conditions: PointConditions = own
      ? conditionsOf(point, parts, context)
      : (shared ??= conditionsOf(point, parts, context));
    points.push(pointIn(conditions, point, parts));
  }
  return points;
}
