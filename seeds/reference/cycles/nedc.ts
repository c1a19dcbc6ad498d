import type { CycleTrace } from '#shared/core/cycles/cycle';

/** What the driver does, in the words of the regulation's breakdown. */
export type Activity =
  | 'idle'
  | 'acceleration'
  | 'steady speed'
  | 'gear change'
  | 'deceleration'
  | 'deceleration, clutch disengaged';

/** An operation: activity, its duration [s], and the speed at its end [km/h]. */
export type Operation = readonly [activity: Activity, seconds: number, endKmh: number];

/** Part One: the elementary urban cycle of UN R83, Annex 4a, table of operations (195 s, driven four times). */
export const URBAN_OPERATIONS: readonly Operation[] = [
  ['idle', 11, 0],
  ['acceleration', 4, 15],
  ['steady speed', 8, 15],
  ['deceleration', 2, 10],
  ['deceleration, clutch disengaged', 3, 0],
  ['idle', 21, 0],
  ['acceleration', 5, 15],
  ['gear change', 2, 15],
  ['acceleration', 5, 32],
  ['steady speed', 24, 32],
  ['deceleration', 8, 10],
  ['deceleration, clutch disengaged', 3, 0],
  ['idle', 21, 0],
  ['acceleration', 5, 15],
  ['gear change', 2, 15],
  ['acceleration', 9, 35],
  ['gear change', 2, 35],
  ['acceleration', 8, 50],
  ['steady speed', 12, 50],
  ['deceleration', 8, 35],
  ['steady speed', 13, 35],
  ['gear change', 2, 32],
  ['deceleration', 7, 10],
  ['deceleration, clutch disengaged', 3, 0],
  ['idle', 7, 0],
];

/** Part Two: the extra-urban cycle of UN R83, Annex 4a, table of operations (400 s). */
export const EXTRA_URBAN_OPERATIONS: readonly Operation[] = [
  ['idle', 20, 0],
  ['acceleration', 5, 15],
  ['gear change', 2, 15],
  ['acceleration', 9, 35],
  ['gear change', 2, 35],
  ['acceleration', 8, 50],
  ['gear change', 2, 50],
  ['acceleration', 13, 70],
  ['steady speed', 50, 70],
  ['deceleration', 8, 50],
  ['steady speed', 69, 50],
  ['acceleration', 13, 70],
  ['steady speed', 50, 70],
  ['acceleration', 35, 100],
  ['steady speed', 30, 100],
  ['acceleration', 20, 120],
  ['steady speed', 10, 120],
  ['deceleration', 16, 80],
  ['deceleration', 8, 50],
  ['deceleration, clutch disengaged', 10, 0],
  ['idle', 20, 0],
];

export const NEDC_OPERATIONS: readonly Operation[] = [
  ...URBAN_OPERATIONS,
  ...URBAN_OPERATIONS,
  ...URBAN_OPERATIONS,
  ...URBAN_OPERATIONS,
  ...EXTRA_URBAN_OPERATIONS,
];

/**
 * The trace of a list of operations from standstill, one row a second: straight lines between the speeds at the ends of
 * the operations, not rounded. The accelerations that the regulation prints beside them are rounded, so these speeds are
 * what counts.
 */
export function traceOfOperations(operations: readonly Operation[]): CycleTrace {
  const speedKmh = [0];
  let startKmh = 0;
  for (const [, seconds, endKmh] of operations) {
    for (let second = 1; second <= seconds; second++) {
      speedKmh.push(startKmh + ((endKmh - startKmh) * second) / seconds);
    }
    startKmh = endKmh;
  }
  return { timeS: speedKmh.map((_, second) => second), speedKmh };
}
