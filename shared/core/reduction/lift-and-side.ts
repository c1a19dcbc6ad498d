import type { LiftAndSide } from '../ranking/ranking-output';
import type { PointInput } from '../ranking/ranking-input';
import { quotedAreaAtModelScale } from './measured-value';
import type { PointFlow, ReducedPoint, ResultParts } from './reduction';
import { needed, quantityOf } from './result-parts';
import { fullScaleDragArea } from './scale';

/** Full-scale area per unit of a lift or side-force value; null where the quantity has none (coastdown). */
function areaPerValue(parts: ResultParts, flow: PointFlow): number | null {
  switch (quantityOf(parts.result)) {
    case 'force':
      return fullScaleDragArea(1 / needed(flow.dynamicPressurePa, 'dynamicPressurePa'), parts.scale);
    case 'coefficient':
      return fullScaleDragArea(quotedAreaAtModelScale(parts), parts.scale);
    case 'drag-area':
      return 1;
    case 'coastdown-f2':
      return null;
  }
}

const statesNone = ({ frontLift, rearLift, sideForce }: PointInput): boolean =>
  frontLift == null && rearLift == null && sideForce == null;

/**
 * Lift and side force of the points that state any, by the steps coefficient and scale only: no tare, no blockage, no later
 * step (method section 3).
 */
export function liftAndSideOf(
  given: readonly PointInput[],
  points: readonly ReducedPoint[],
  parts: ResultParts,
): LiftAndSide[] {
  if (given.every(statesNone)) return [];
  return given.flatMap((point, i) => {
    const { frontLift, rearLift, sideForce } = point;
    const reduced = points[i];
    if (reduced === undefined || statesNone(point)) return [];
    const perValue = areaPerValue(parts, reduced.flow);
    if (perValue === null) return [];
    const areaOf = (value: number | null | undefined): number | null =>
      value == null ? null : value * perValue;
    return [
      {
        yawDeg: reduced.yawDeg,
        frontLiftAreaM2: areaOf(frontLift),
        rearLiftAreaM2: areaOf(rearLift),
        sideForceAreaM2: areaOf(sideForce),
      },
    ];
  });
}
