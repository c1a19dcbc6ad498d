import type { Reduction } from '../reduction/reduction';
import { isZeroYaw } from '../reduction/yaw/yaw-points';
import { check, limit, within, type Check } from './check';
import type { CheckLimits } from './limits';

/**
 * Scatter of single readings at zero yaw over the drag area, dimensionless: the result's own s, else the facility's. A
 * result that states its whole uncertainty may have neither.
 */
export function repeatabilityCheck({ points, parts }: Reduction, limits: CheckLimits): Check {
  const upTo = limit({ to: limits.repeatabilityCaution });
  const given = parts.result.points ?? [];
  const scatters = points.flatMap((point, i) => {
    const reading = given[i];
    if (!isZeroYaw(point.yawDeg) || point.repeatability === null || reading === undefined) return [];
    const single = Math.abs(point.repeatability.amountM2) * Math.sqrt(reading.n ?? 1);
    return [{ value: single / point.dragAreaM2, own: reading.s != null }];
  });
  const worst = scatters.reduce<(typeof scatters)[number] | null>(
    (found, each) => (found === null || each.value > found.value ? each : found),
    null,
  );
  const common = {
    check: 'repeatability',
    unit: 'fraction',
    limit: upTo,
    policy: 'repeatabilityCaution',
  } as const;
  if (worst === null) return check({ ...common, verdict: 'passes', finding: 'stated-uncertainty' });
  return check({
    ...common,
    verdict: within(worst.value, upTo),
    value: worst.value,
    finding: worst.own ? null : 'facility-repeatability',
  });
}

/** How far the sweep reaches on both sides; mirrored angles of a sweep on one side count for the other. */
function yawReach(angles: readonly number[]): number {
  const right = Math.max(0, ...angles);
  const left = Math.max(0, ...angles.map((angle) => -angle));
  return left === 0 || right === 0 ? Math.max(left, right) : Math.min(left, right);
}

/**
 * Whether the yaw sweep reaches as far as the organisation wants it for a wind average, and whether the method could form
 * one. A result of zero yaw alone passes: it counts for the ranking at zero yaw.
 */
export function yawCoverageCheck({ points, windAverage }: Reduction, limits: CheckLimits): Check {
  const reach = yawReach(points.map(({ yawDeg }) => yawDeg));
  const from = limit({ from: limits.yawCoverageDeg });
  const common = {
    check: 'yaw-coverage',
    value: reach,
    unit: '°',
    limit: from,
    policy: 'yawCoverageDeg',
  } as const;
  if (points.every(({ yawDeg }) => isZeroYaw(yawDeg))) {
    return check({ ...common, verdict: 'passes', finding: 'zero-yaw-only' });
  }
  if (windAverage.refusal !== null)
    return check({ ...common, verdict: 'caution', finding: 'no-wind-average' });
  return check({ ...common, verdict: within(reach, from) });
}

/** Whether angles without their opposite stand in a sweep whose pairs differ (method section 7); only where there is an average. */
export function yawPairsCheck({ windAverage }: Reduction): Check[] {
  if (windAverage.yaw === null) return [];
  const unpaired = windAverage.yaw.cautions.includes('unpaired-yaw-in-unsymmetrical-sweep');
  return [check({ check: 'yaw-pairs', verdict: unpaired ? 'caution' : 'passes' })];
}
