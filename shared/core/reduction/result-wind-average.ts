import { SPEED_TOLERANCE } from '../constants';
import { Refused, refuse } from '../refusal';
import { amount, budgetOf, scaled, type KeyedFigure } from '../uncertainty/budget';
import type { ReducedPoint, ReductionContext, ResultParts, WindAverage } from './reduction';
import { evaluateYaw, type YawOutput } from './yaw/yaw-ratio';
import { isZeroYaw, type YawPoint } from './yaw/yaw-points';

/** Two speeds are one when they differ by no more than rounding. */
export function sameSpeed(a: ReducedPoint, b: ReducedPoint): boolean {
  if (a.flow === b.flow) return true;
  const speedA = a.flow.speedMs;
  const speedB = b.flow.speedMs;
  if (speedA === null || speedB === null) return speedA === speedB;
  return Math.abs(speedA - speedB) <= SPEED_TOLERANCE * speedB;
}

/**
 * The points of the yaw sweep: those at the speed of the yawed ones.
 *
 * @throws {Refused} yaw-mixed-speeds, missing-input (a point without uncertainty of its reading)
 */
function sweepPoints(points: readonly ReducedPoint[]): YawPoint[] {
  const first = points.find((point) => !isZeroYaw(point.yawDeg));
  const sweep = first === undefined ? points : points.filter((point) => sameSpeed(point, first));
  if (points.some((point) => !isZeroYaw(point.yawDeg) && !sweep.includes(point))) {
    refuse('yaw-mixed-speeds', 'points', 'The yawed points were taken at several speeds.');
  }
  return sweep.map(({ yawDeg, dragAreaM2, repeatability }) => ({
    yawDeg,
    dragAreaM2,
    uM2: repeatability?.amountM2 ?? NaN,
    degreesOfFreedom: repeatability?.degreesOfFreedom,
  }));
}

/**
 * The wind-averaged figure: everything times k_ψ; the zero point's amount joins, with its sign, the repeatability of the
 * zero-yaw figure, because the same reading fixed both; the others form `yaw-ratio:<result>` (method section 7).
 */
function windAveragedFigure(resultId: string, zeroYaw: KeyedFigure, yaw: YawOutput): KeyedFigure {
  const { dragAreaM2, budget } = zeroYaw;
  return {
    dragAreaM2: dragAreaM2 * yaw.yawRatio,
    budget: budgetOf([
      ...scaled(budget, yaw.yawRatio),
      amount(`repeatability:${resultId}`, dragAreaM2 * yaw.zeroPointAmount, yaw.zeroPointDegreesOfFreedom),
      amount(`yaw-ratio:${resultId}`, dragAreaM2 * yaw.otherPointsAmount, yaw.otherPointsDegreesOfFreedom),
    ]),
  };
}

/** The yaw of a result's own sweep applied last to its zero-yaw figure, or the code why there is none. */
export function windAverageOf(
  parts: ResultParts,
  points: readonly ReducedPoint[],
  zeroYaw: KeyedFigure,
  { programme, wind }: ReductionContext,
): WindAverage {
  // Most results have no yawed point: to say so needs no exception.
  if (points.every((point) => isZeroYaw(point.yawDeg))) {
    return { yaw: null, figure: null, refusal: 'yaw-too-few-angles' };
  }
  try {
    const sweep = sweepPoints(points);
    const { referenceSpeedKmh, windSpeedMs } = programme;
    const yaw = evaluateYaw({ points: sweep, referenceSpeedKmh, windSpeedMs }, wind);
    if (sweep.some((point) => Number.isNaN(point.uM2))) {
      refuse('missing-input', 'points.s', 'A point of the sweep has no uncertainty of its reading.');
    }
    return { yaw, figure: windAveragedFigure(parts.result.id, zeroYaw, yaw), refusal: null };
  } catch (error) {
    if (error instanceof Refused) return { yaw: null, figure: null, refusal: error.code };
    throw error;
  }
}
