import type { PointInput } from '../ranking/ranking-input';
import { refuse } from '../refusal';
import type { ReducedPoint, ResultParts } from './reduction';

/**
 * Number of readings behind a point.
 *
 * @throws {Refused} not-positive (under 1), repeatability-needs-two (s of a single reading)
 */
export function readingsOf(point: PointInput): number {
  const n = point.n ?? 1;
  if (!(n >= 1)) refuse('not-positive', 'points.n', `The number of readings must be at least 1, not ${n}.`);
  if (point.s != null && n === 1) {
    refuse('repeatability-needs-two', 'points.s', 'A standard deviation needs at least two readings.');
  }
  return n;
}

/**
 * s/√n with ν = n − 1; without s the facility's single-reading repeatability over √n; without either a gap (method section 9).
 *
 * @param perValue d(full-scale drag area)/d(value)
 */
export function repeatabilityOf(
  point: PointInput,
  { facility }: ResultParts,
  perValue: number,
  dragAreaM2: number,
): ReducedPoint['repeatability'] {
  const n = readingsOf(point);
  if (point.s != null) {
    return { amountM2: (point.s / Math.sqrt(n)) * perValue, degreesOfFreedom: n - 1 };
  }
  if (facility.repeatabilityURelative == null) return null;
  return {
    amountM2: (facility.repeatabilityURelative * dragAreaM2) / Math.sqrt(n),
    degreesOfFreedom: facility.repeatabilityDegreesOfFreedom ?? Infinity,
  };
}
