import { KMH_PER_MS } from '#shared/core/constants';
import type { PlanningLimits } from '#shared/core/planning/limits';

/** A point of the map: scale, and speed in km/h. */
export interface MapPoint {
  readonly scale: number;
  readonly speedKmh: number;
}

/** What the map draws: the limits of one facility and target, and where the test stands. */
export interface SpeedScaleModel {
  readonly limits: PlanningLimits;
  /** The scale at which the model would fill the whole section; possibly above 1. */
  readonly fullSectionScale: number;
  readonly machCaution: number;
  readonly machLimit: number;
  readonly targetReynolds: number;
  readonly acceptedReynolds: number | undefined;
  readonly minimumReynolds: number;
  readonly balanceN: number | undefined;
  /** Where the test is to be run. */
  readonly working: MapPoint;
  /** The speed that is needed at the same scale. */
  readonly neededKmh: number;
}

/** One upright slice of the region in which every limit is kept. */
export interface RegionSlice {
  readonly scale: number;
  readonly lowestKmh: number;
  readonly highestKmh: number;
}

/** Below this the map says nothing: no model is that small. */
export const SMALLEST_SCALE = 0.05;
const SLICES = 60;

/** The least speed that reaches what is wanted: the accepted Reynolds number where there is one, else the target. */
export function lowestKmhAt({ limits }: SpeedScaleModel, scale: number): number {
  return (limits.acceptedReynolds ?? limits.targetReynolds)(scale) * KMH_PER_MS;
}

/** The highest speed that Mach number, facility and balance allow. */
export function highestKmhAt({ limits }: SpeedScaleModel, scale: number): number {
  const { machLimitMs, facilityMaximumMs, balanceRange } = limits;
  return (
    Math.min(
      machLimitMs,
      facilityMaximumMs ?? Number.POSITIVE_INFINITY,
      balanceRange?.(scale) ?? Number.POSITIVE_INFINITY,
    ) * KMH_PER_MS
  );
}

/** β at a scale. */
export function blockageAt({ fullSectionScale }: SpeedScaleModel, scale: number): number {
  return (scale / fullSectionScale) ** 2;
}

/** Whether every limit is kept at a point: speeds, force and blockage; cautions count as kept. */
export function keepsEveryLimit(model: SpeedScaleModel, { scale, speedKmh }: MapPoint): boolean {
  return (
    scale <= Math.min(1, model.limits.blockageExcludedScale) &&
    speedKmh >= lowestKmhAt(model, scale) &&
    speedKmh <= highestKmhAt(model, scale)
  );
}

/**
 * The region in which every limit is kept, as upright slices by ascending scale; empty where there is none. Required speed
 * and balance fall with 1/scale, the other ceilings are level: the region is one piece, from the scale at which the
 * required speed meets the level ceilings up to the blockage limit.
 */
export function regionOf(model: SpeedScaleModel): readonly RegionSlice[] {
  const { limits } = model;
  const levelKmh =
    Math.min(limits.machLimitMs, limits.facilityMaximumMs ?? Number.POSITIVE_INFINITY) * KMH_PER_MS;
  const from = Math.max(SMALLEST_SCALE, lowestKmhAt(model, 1) / levelKmh);
  const to = Math.min(1, limits.blockageExcludedScale);
  if (!(from < to)) return [];
  const slices = Array.from({ length: SLICES + 1 }, (_, i) => {
    const scale = from + ((to - from) * i) / SLICES;
    return { scale, lowestKmh: lowestKmhAt(model, scale), highestKmh: highestKmhAt(model, scale) };
  });
  // Rounding must not lose the corner at which both meet.
  return slices.some(({ lowestKmh, highestKmh }) => lowestKmh > highestKmh * (1 + 1e-9)) ? [] : slices;
}
