import { KMH_PER_MS } from '../constants';
import { refuse } from '../refusal';

/**
 * A driving cycle as rows of time [s] and speed [km/h]. Between two rows the speed changes evenly, so a step has one
 * acceleration and one mean speed.
 */
export interface CycleTrace {
  readonly timeS: ArrayLike<number>;
  readonly speedKmh: ArrayLike<number>;
}

/**
 * The steps of a cycle by falling acceleration, for sums over steps with a force above or below 0. In this order the force
 * changes its sign nearly once only, so that the processor guesses the branch right: about a tenth faster than in the order
 * of time.
 */
export interface StepsByAcceleration {
  readonly meanSpeedKmh: Float64Array;
  readonly accelerationMs2: Float64Array;
  readonly stepDistanceM: Float64Array;
}

/**
 * A cycle laid out for the energy calculation: one entry a step, everything that does not depend on the vehicle worked
 * out once. Every array has `steps` entries, in the order of time but for those under `byAcceleration`.
 */
export interface PreparedCycle {
  readonly steps: number;
  /** Last less first time [s]. */
  readonly durationS: number;
  /** Σ v̄/3.6·Δt [m]. */
  readonly distanceM: number;
  /** Δt [s]. */
  readonly stepS: Float64Array;
  /** v̄ = (v_i + v_{i−1})/2 [km/h]. */
  readonly meanSpeedKmh: Float64Array;
  /** (v_i − v_{i−1})/(3.6·Δt) [m/s²]. */
  readonly accelerationMs2: Float64Array;
  /** d = v̄/3.6·Δt [m]. */
  readonly stepDistanceM: Float64Array;
  /** 1 where the step begins and ends at 0 km/h, else 0. */
  readonly standing: Uint8Array;
  readonly byAcceleration: StepsByAcceleration;
}

/** Rows are counted from 1, as a person sees them. */
const row = (index: number): string => `cycle row ${index + 1}`;

function checkTimes(timeS: ArrayLike<number>, rows: number): void {
  for (let i = 1; i < rows; i++) {
    if (!(Number(timeS[i]) > Number(timeS[i - 1]))) {
      refuse(
        'cycle-time-not-increasing',
        row(i),
        'The time of every row must be later than that of the row before.',
      );
    }
  }
}

function checkSpeeds(speedKmh: ArrayLike<number>, rows: number): void {
  let moves = false;
  for (let i = 0; i < rows; i++) {
    const speed = Number(speedKmh[i]);
    if (!(speed >= 0)) refuse('cycle-negative-speed', row(i), 'A speed must be 0 km/h or more.');
    if (speed > 0) moves = true;
  }
  if (!moves)
    refuse('cycle-standing', 'cycle', 'The vehicle never moves: at least one speed must be above 0 km/h.');
}

function sortedByAcceleration(steps: StepsByAcceleration): StepsByAcceleration {
  const { accelerationMs2 } = steps;
  const order = Uint32Array.from(accelerationMs2, (_, i) => i).sort(
    (a, b) => (accelerationMs2[b] as number) - (accelerationMs2[a] as number),
  );
  const inOrder = (values: Float64Array): Float64Array =>
    Float64Array.from(order, (step) => values[step] as number);
  return {
    meanSpeedKmh: inOrder(steps.meanSpeedKmh),
    accelerationMs2: inOrder(accelerationMs2),
    stepDistanceM: inOrder(steps.stepDistanceM),
  };
}

/**
 * Checks a trace and works out its steps (form of UN GTR No. 15, Annex 7, from memory; the figures agree).
 *
 * @throws {Refused} malformed-input (times and speeds of different number), cycle-too-short (under two rows),
 *   cycle-time-not-increasing, cycle-negative-speed, cycle-standing (never moves); tested in this order
 */
export function prepareCycle(trace: CycleTrace): PreparedCycle {
  const { timeS, speedKmh } = trace;
  const rows = timeS.length;
  if (speedKmh.length !== rows) {
    refuse('malformed-input', 'cycle.speedKmh', `There are ${rows} times but ${speedKmh.length} speeds.`);
  }
  if (rows < 2) refuse('cycle-too-short', 'cycle', 'A cycle needs at least two rows.');
  checkTimes(timeS, rows);
  checkSpeeds(speedKmh, rows);

  const steps = rows - 1;
  const stepS = new Float64Array(steps);
  const meanSpeedKmh = new Float64Array(steps);
  const accelerationMs2 = new Float64Array(steps);
  const stepDistanceM = new Float64Array(steps);
  const standing = new Uint8Array(steps);
  let distanceM = 0;
  for (let i = 0; i < steps; i++) {
    const before = Number(speedKmh[i]);
    const after = Number(speedKmh[i + 1]);
    const seconds = Number(timeS[i + 1]) - Number(timeS[i]);
    const mean = (after + before) / 2;
    const distance = (mean / KMH_PER_MS) * seconds;
    stepS[i] = seconds;
    meanSpeedKmh[i] = mean;
    accelerationMs2[i] = (after - before) / (KMH_PER_MS * seconds);
    stepDistanceM[i] = distance;
    standing[i] = before === 0 && after === 0 ? 1 : 0;
    distanceM += distance;
  }
  const durationS = Number(timeS[rows - 1]) - Number(timeS[0]);
  const byAcceleration = sortedByAcceleration({ meanSpeedKmh, accelerationMs2, stepDistanceM });
  return {
    steps,
    durationS,
    distanceM,
    stepS,
    meanSpeedKmh,
    accelerationMs2,
    stepDistanceM,
    standing,
    byAcceleration,
  };
}

/**
 * One step at an even speed [km/h] over a duration [s]. It does not start from rest, so it holds no acceleration.
 *
 * @throws {Refused} not-positive
 */
export function constantSpeedCycle(constantSpeedKmh: number, durationS: number): CycleTrace {
  if (!(constantSpeedKmh > 0)) {
    refuse('not-positive', 'cycle.constantSpeedKmh', 'The constant speed must be above 0 km/h.');
  }
  if (!(durationS > 0)) refuse('not-positive', 'cycle.durationS', 'The duration must be above 0 s.');
  return { timeS: [0, durationS], speedKmh: [constantSpeedKmh, constantSpeedKmh] };
}
