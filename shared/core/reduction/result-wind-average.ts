import { AMOUNT_FLOOR_M2, SPEED_TOLERANCE } from '../constants';
import { Refused, refuse } from '../refusal';
import { amount, budgetOf, scaled, type Budget, type KeyedFigure } from '../uncertainty/budget';
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
 * zero-yaw figure, because the same reading fixed both; the others form `yaw-ratio:<result>` (method section 7). Of thousands
 * of results few are looked at by key, so the budget is made when it is asked for.
 */
class WindAveragedFigure implements KeyedFigure {
  readonly dragAreaM2: number;
  private made: Budget | null = null;

  constructor(
    private readonly resultId: string,
    private readonly zeroYaw: KeyedFigure,
    private readonly yaw: YawOutput,
  ) {
    this.dragAreaM2 = zeroYaw.dragAreaM2 * yaw.yawRatio;
  }

  get budget(): Budget {
    this.made ??= windAveragedBudget(this.resultId, this.zeroYaw, this.yaw);
    return this.made;
  }
}

function windAveragedBudget(resultId: string, { dragAreaM2, budget }: KeyedFigure, yaw: YawOutput): Budget {
  const amounts = scaled(budget, yaw.yawRatio);
  const { zeroPointDegreesOfFreedom, otherPointsDegreesOfFreedom } = yaw;
  amounts.push(
    amount(`repeatability:${resultId}`, dragAreaM2 * yaw.zeroPointAmount, zeroPointDegreesOfFreedom),
    amount(`yaw-ratio:${resultId}`, dragAreaM2 * yaw.otherPointsAmount, otherPointsDegreesOfFreedom),
  );
  return budgetOf(amounts);
}

/** u of the wind-averaged figure [m²] without its budget: the same squares, summed in the same order of keys. */
export function windAveragedUncertainty(
  resultId: string,
  { dragAreaM2, budget }: KeyedFigure,
  yaw: YawOutput,
): number {
  const repeatabilityKey = `repeatability:${resultId}`;
  const zeroPointM2 = dragAreaM2 * yaw.zeroPointAmount;
  const othersM2 = dragAreaM2 * yaw.otherPointsAmount;
  let variance = 0;
  let joined = false;
  for (const { key, amountM2 } of budget) {
    let c = amountM2 * yaw.yawRatio;
    if (!joined && key >= repeatabilityKey) {
      joined = true;
      if (key === repeatabilityKey) c += zeroPointM2;
      else variance += zeroPointM2 * zeroPointM2;
    }
    variance += c * c;
  }
  if (!joined) variance += zeroPointM2 * zeroPointM2;
  const u = Math.sqrt(variance + othersM2 * othersM2);
  return u < AMOUNT_FLOOR_M2 ? 0 : u;
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
    return { yaw, figure: new WindAveragedFigure(parts.result.id, zeroYaw, yaw), refusal: null };
  } catch (error) {
    if (error instanceof Refused) return { yaw: null, figure: null, refusal: error.code };
    throw error;
  }
}
