import type { ResultInput } from '../ranking/ranking-input';
import type { SweepPoint } from '../similarity/reynolds-sweep';
import { reducePoints } from './reduce-point';
import type { ReductionContext } from './reduction';
import { asSweep } from './reynolds-step';
import { needed, resultPartsOf } from './result-parts';
import { isZeroYaw } from './yaw/yaw-points';

/**
 * The zero-yaw points of a result as a Reynolds sweep for others: each reduced on its own, at its own speed, to the full-scale
 * drag area [m²]. How many they are and how far they reach is for the fit to judge.
 *
 * @throws {Refused} the codes that refuse the result by itself up to the full-scale drag area
 */
export function sweepPointsOf(result: ResultInput, context: ReductionContext): readonly SweepPoint[] {
  const parts = resultPartsOf(result, context);
  const zeroYaw = needed(result.points, 'points').filter(({ yawDeg }) => isZeroYaw(yawDeg ?? 0));
  return asSweep(reducePoints(zeroYaw, parts, context));
}
