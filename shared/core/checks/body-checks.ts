import { QUOTED_AREA_RANGE } from '../constants';
import { quotedAreaAtModelScale } from '../reduction/measured-value';
import type { Reduction } from '../reduction/reduction';
import { fullScaleDragArea } from '../reduction/scale';
import { isZeroYaw } from '../reduction/yaw/yaw-points';
import { check, limit, within, type Check, type CheckName } from './check';
import type { CheckLimits } from './limits';

/** Drag coefficient on the variant's frontal area, and that area, against what its body shape usually has. */
export function plausibilityChecks(
  { output, parts }: Reduction,
  limits: CheckLimits,
  bodyShape: string,
): Check[] {
  const usual = limits.plausible.find((body) => body.bodyShape === bodyShape);
  if (usual === undefined) return [];
  const { frontalAreaM2 } = parts.variant;
  const coefficient = output.zeroYaw.dragAreaM2 / frontalAreaM2;
  return [
    check({
      check: 'drag-coefficient',
      verdict: within(coefficient, usual.dragCoefficient),
      value: coefficient,
      limit: limit(usual.dragCoefficient),
      policy: 'plausible',
    }),
    check({
      check: 'frontal-area',
      verdict: within(frontalAreaM2, usual.frontalAreaM2),
      value: frontalAreaM2,
      unit: 'm²',
      limit: limit(usual.frontalAreaM2),
      policy: 'plausible',
    }),
  ];
}

/** The area that a coefficient is quoted on against the variant's frontal area, at full scale [m²] (method section 11). */
export function quotedAreaCheck({ parts }: Reduction): Check[] {
  if (parts.result.quantity !== 'coefficient') return [];
  const quotedM2 = fullScaleDragArea(quotedAreaAtModelScale(parts), parts.scale);
  const { frontalAreaM2 } = parts.variant;
  const usual = {
    from: QUOTED_AREA_RANGE.from * frontalAreaM2,
    to: QUOTED_AREA_RANGE.to * frontalAreaM2,
  };
  return [
    check({
      check: 'quoted-area',
      verdict: within(quotedM2, usual),
      value: quotedM2,
      unit: 'm²',
      limit: limit(usual),
    }),
  ];
}

/** Lift coefficients at zero yaw on the frontal area, front and rear, where they are stated; lift upwards is positive. */
export function liftChecks({ output, parts }: Reduction, limits: CheckLimits): Check[] {
  const zeroYaw = output.liftAndSide.filter(({ yawDeg }) => isZeroYaw(yawDeg));
  const axle = (
    name: CheckName,
    areas: readonly (number | null)[],
    policy: 'frontLiftLimit' | 'rearLiftLimit',
  ): Check[] => {
    const stated = areas.filter((area) => area !== null);
    if (stated.length === 0) return [];
    const coefficient =
      stated.reduce((sum, area) => sum + area, 0) / stated.length / parts.variant.frontalAreaM2;
    const upTo = limit({ to: limits[policy] });
    return [
      check({ check: name, verdict: within(coefficient, upTo), value: coefficient, limit: upTo, policy }),
    ];
  };
  return [
    ...axle(
      'front-lift',
      zeroYaw.map(({ frontLiftAreaM2 }) => frontLiftAreaM2),
      'frontLiftLimit',
    ),
    ...axle(
      'rear-lift',
      zeroYaw.map(({ rearLiftAreaM2 }) => rearLiftAreaM2),
      'rearLiftLimit',
    ),
  ];
}
