import { KM_PER_MILE, KMH_PER_MS } from '../constants';
import { prepareCycle, type CycleTrace, type PreparedCycle } from './cycle';

/** Units that a person may have written the times of a cycle in: seconds in each. */
export const TIME_UNITS = { s: 1, min: 60 } as const;
export type TimeUnit = keyof typeof TIME_UNITS;

/** Units that a person may have written the speeds of a cycle in: km/h in each. */
export const SPEED_UNITS = { 'km/h': 1, 'm/s': KMH_PER_MS, mph: KM_PER_MILE } as const;
export type SpeedUnit = keyof typeof SPEED_UNITS;

/** Rows of one's own, as they were written. */
export interface OwnCycleRows {
  readonly time: readonly number[];
  readonly timeUnit: TimeUnit;
  readonly speed: readonly number[];
  readonly speedUnit: SpeedUnit;
}

/** What a person compares with what they know of the cycle, so that a wrong trace is noticed. */
export interface CycleTotals {
  readonly rows: number;
  readonly durationS: number;
  readonly distanceM: number;
  readonly maximumSpeedKmh: number;
  /** Distance over duration, standing time included. */
  readonly meanSpeedKmh: number;
  readonly maximumAccelerationMs2: number;
  /** As a positive number. */
  readonly maximumDecelerationMs2: number;
  /** Time in steps that begin and end at 0 km/h. */
  readonly standingS: number;
}

export type CycleCautionCode =
  'implausible-acceleration' | 'implausible-speed' | 'time-gap' | 'starts-moving' | 'ends-moving';

/** A doubt about the trace; it can still be used. */
export interface CycleCaution {
  readonly code: CycleCautionCode;
  /** The first row concerned, counted from 1. */
  readonly row: number;
  /** How many rows (or steps, by their last row) are concerned. */
  readonly count: number;
  /** The most extreme value, in the unit that its name says (m/s², km/h, s). */
  readonly extreme: number;
}

export interface OwnCycle {
  readonly trace: CycleTrace;
  readonly prepared: PreparedCycle;
  readonly totals: CycleTotals;
  readonly cautions: readonly CycleCaution[];
}

/** Beyond any road car on road tyres: the usual cause is a wrong unit or a missing row [m/s²]. */
const IMPLAUSIBLE_ACCELERATION_MS2 = 5;
const IMPLAUSIBLE_SPEED_KMH = 300;
/** A step this long [s] leaves out what the vehicle did meanwhile. */
const LONG_STEP_S = 10;

/** Totals of a cycle. */
export function cycleTotals(trace: CycleTrace, prepared: PreparedCycle): CycleTotals {
  let maximumSpeedKmh = 0;
  for (let i = 0; i < trace.speedKmh.length; i++) {
    maximumSpeedKmh = Math.max(maximumSpeedKmh, trace.speedKmh[i] as number);
  }
  let steepest = 0;
  let hardest = 0;
  let standingS = 0;
  for (let i = 0; i < prepared.steps; i++) {
    const acceleration = prepared.accelerationMs2[i] as number;
    steepest = Math.max(steepest, acceleration);
    hardest = Math.max(hardest, -acceleration);
    if (prepared.standing[i] === 1) standingS += prepared.stepS[i] as number;
  }
  return {
    rows: trace.timeS.length,
    durationS: prepared.durationS,
    distanceM: prepared.distanceM,
    maximumSpeedKmh,
    meanSpeedKmh: (KMH_PER_MS * prepared.distanceM) / prepared.durationS,
    maximumAccelerationMs2: steepest,
    maximumDecelerationMs2: hardest,
    standingS,
  };
}

/** One caution over all values beyond a limit, or none. `firstRow` is the row of the first value, counted from 1. */
function beyond(
  code: CycleCautionCode,
  values: ArrayLike<number>,
  limit: number,
  firstRow: number,
): CycleCaution[] {
  let row = 0;
  let count = 0;
  let extreme = 0;
  for (let i = 0; i < values.length; i++) {
    const value = values[i] as number;
    if (Math.abs(value) <= limit) continue;
    if (count === 0) row = i + firstRow;
    count += 1;
    if (Math.abs(value) > Math.abs(extreme)) extreme = value;
  }
  return count === 0 ? [] : [{ code, row, count, extreme }];
}

function movingAt(code: CycleCautionCode, speedKmh: ArrayLike<number>, index: number): CycleCaution[] {
  const extreme = speedKmh[index] as number;
  return extreme > 0 ? [{ code, row: index + 1, count: 1, extreme }] : [];
}

/**
 * Turns rows of one's own into a checked trace, in seconds and km/h, with its totals and everything that looks wrong.
 *
 * Cautions: accelerations beyond ±5 m/s², speeds above 300 km/h, steps longer than 10 s, and a trace that does not begin
 * or end at rest (allowed, but then the energy to get there, or what is left of it, is not counted).
 *
 * @throws {Refused} malformed-input, cycle-too-short, cycle-time-not-increasing, cycle-negative-speed, cycle-standing
 */
export function checkOwnCycle(rows: OwnCycleRows): OwnCycle {
  const seconds = TIME_UNITS[rows.timeUnit];
  const kmh = SPEED_UNITS[rows.speedUnit];
  const timeS = rows.time.map((time) => time * seconds);
  const speedKmh = rows.speed.map((speed) => speed * kmh);
  const trace = { timeS, speedKmh };
  const prepared = prepareCycle(trace);
  return {
    trace,
    prepared,
    totals: cycleTotals(trace, prepared),
    cautions: [
      ...beyond('implausible-acceleration', prepared.accelerationMs2, IMPLAUSIBLE_ACCELERATION_MS2, 2),
      ...beyond('implausible-speed', speedKmh, IMPLAUSIBLE_SPEED_KMH, 1),
      ...beyond('time-gap', prepared.stepS, LONG_STEP_S, 2),
      ...movingAt('starts-moving', speedKmh, 0),
      ...movingAt('ends-moving', speedKmh, speedKmh.length - 1),
    ],
  };
}
