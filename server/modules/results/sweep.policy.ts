import type { ResultFields, ResultPoint } from '#shared/contracts/results';
import { SWEEP_MIN_POINTS, SWEEP_MIN_RATIO } from '#shared/core/constants';
import { Issues, type Issue } from '../../rules/issue';

type Speeds = Pick<ResultFields, 'speedKmh' | 'dynamicPressurePa'>;

/** Speeds in one and the same measure: km/h, or the root of the dynamic pressure; null where some have one, some the other. */
function comparableSpeeds(points: readonly ResultPoint[], fields: Speeds): readonly number[] | null {
  const typed = points.flatMap((point) => point.speedKmh ?? fields.speedKmh ?? []);
  if (typed.length === points.length) return typed;
  const pressures = points.flatMap((point) => point.dynamicPressurePa ?? fields.dynamicPressurePa ?? []);
  return typed.length === 0 && pressures.length === points.length ? pressures.map(Math.sqrt) : null;
}

/**
 * Zero-yaw readings at several speeds are a Reynolds sweep, and can be used as nothing else: what the fit would refuse for
 * certain is refused at the door. In one air the Reynolds number goes with the speed.
 */
export function sweepIssues(atZero: readonly ResultPoint[], fields: Speeds): readonly Issue[] {
  const speeds = comparableSpeeds(atZero, fields);
  if (speeds === null || new Set(speeds).size < 2) return [];
  const ratio = Math.max(...speeds) / Math.min(...speeds);
  return new Issues()
    .when(
      atZero.length < SWEEP_MIN_POINTS,
      'points',
      `Readings at zero yaw at several speeds are a Reynolds sweep, and a line through it needs ${SWEEP_MIN_POINTS} of them, not ${atZero.length}. Add readings, or enter one result per speed.`,
      'sweep-too-few-points',
    )
    .when(
      ratio < SWEEP_MIN_RATIO,
      'points',
      `A Reynolds sweep must reach to ${SWEEP_MIN_RATIO} times its lowest speed; this one reaches to ${ratio.toFixed(2)} times. Add readings further apart, or enter one result per speed.`,
      'sweep-too-narrow',
    ).list;
}
