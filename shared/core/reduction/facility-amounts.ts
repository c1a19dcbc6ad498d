import type { FacilityInput } from '../ranking/ranking-input';
import { refuse } from '../refusal';
import { amount, type Amount } from '../uncertainty/budget';
import type { ReducedPoint, ResultParts } from './reduction';
import { needed, neededPositive } from './result-parts';
import { combinedDegreesOfFreedom } from './yaw/yaw-points';

/** Relative (of the full-scale drag area) and absolute part add. */
function typed(
  relative: number | null | undefined,
  absoluteM2: number | null | undefined,
  dragAreaM2: number,
): number {
  return (relative ?? 0) * dragAreaM2 + (absoluteM2 ?? 0);
}

export function biasKey(facility: FacilityInput): string {
  return facility.kind === 'simulation' ? `simulation-bias:${facility.id}` : `facility-bias:${facility.id}`;
}

/** The bias of a facility at a drag area [m²]. */
export function biasAmountOf(facility: FacilityInput, dragAreaM2: number): number {
  return typed(facility.biasURelative, facility.biasUM2, dragAreaM2);
}

/**
 * A source's own U/k stands for repeatability, installation and session; if the facility's bias is in it, the bias keeps its
 * key and the stated amount is √(u² − u_bias²), 0 if that is negative (method section 9). Of several zero-yaw points each has
 * its own amount, at its own drag area; like every other key theirs are weighed as the figure weighs the points.
 */
function statedAmount(
  parts: ResultParts,
  points: readonly ReducedPoint[],
  weights: readonly number[] | null,
): Amount[] {
  const { result } = parts;
  const { stated } = result;
  if (stated == null) return [];
  const uValue = needed(stated.expandedU, 'stated.expandedU') / neededPositive(stated.k, 'stated.k');
  const ownAmounts = points.map(({ perValue, dragAreaM2 }) => {
    const u = uValue * perValue;
    const bias = stated.includesFacilityBias ? biasAmountOf(parts.facility, dragAreaM2) : 0;
    return Math.sqrt(Math.max(0, u * u - bias * bias));
  });
  const held =
    weights === null
      ? ownAmounts.reduce((sum, own) => sum + own, 0) / points.length
      : ownAmounts.reduce((sum, own, i) => sum + own * (weights[i] ?? NaN), 0);
  return [amount(`stated:${result.id}`, held, stated.degreesOfFreedom)];
}

/**
 * Repeatability of the mean of several points, taken as independent.
 *
 * @throws {Refused} missing-input: neither s nor the facility's repeatability is there
 */
function repeatabilityAmount({ result }: ResultParts, points: readonly ReducedPoint[]): Amount {
  const parts = points.map(({ repeatability }) => {
    if (repeatability === null) {
      refuse(
        'missing-input',
        'points.s',
        'Neither s nor the facility’s repeatability nor a stated uncertainty is given.',
      );
    }
    return {
      amount: repeatability.amountM2 / points.length,
      degreesOfFreedom: repeatability.degreesOfFreedom,
    };
  });
  const [only] = parts;
  const degreesOfFreedom =
    parts.length === 1 && only !== undefined ? only.degreesOfFreedom : combinedDegreesOfFreedom(parts);
  return amount(
    `repeatability:${result.id}`,
    Math.hypot(...parts.map((part) => part.amount)),
    degreesOfFreedom,
  );
}

function sessionAndInstallation({ result, facility }: ResultParts, dragAreaM2: number): Amount[] {
  return [
    amount(
      `session:${result.sessionId ?? result.id}`,
      typed(facility.sessionURelative, facility.sessionUM2, dragAreaM2),
      facility.sessionDegreesOfFreedom,
    ),
    amount(
      `installation:${result.installationId ?? result.id}`,
      typed(facility.installationURelative, facility.installationUM2, dragAreaM2),
      facility.installationDegreesOfFreedom,
    ),
  ];
}

/**
 * What comes with the facility and the reading rather than with a correction, at the full-scale drag area [m²] of the
 * zero-yaw points.
 *
 * @param weights how much of each point the figure of an own sweep holds; the sweep's own scatter stands for the repeatability.
 *   Null: their mean.
 * @throws {Refused} missing-input
 */
export function facilityAmounts(
  parts: ResultParts,
  points: readonly ReducedPoint[],
  dragAreaM2: number,
  weights: readonly number[] | null = null,
): Amount[] {
  const bias = amount(biasKey(parts.facility), biasAmountOf(parts.facility, dragAreaM2));
  if (parts.result.stated != null) return [bias, ...statedAmount(parts, points, weights)];
  const places = sessionAndInstallation(parts, dragAreaM2);
  return weights === null ? [bias, repeatabilityAmount(parts, points), ...places] : [bias, ...places];
}
