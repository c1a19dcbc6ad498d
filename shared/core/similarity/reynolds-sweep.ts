import { SWEEP_MIN_POINTS, SWEEP_MIN_RATIO } from '../constants';
import { refuse } from '../refusal';
import { reynoldsOfSkinFriction, skinFriction } from './skin-friction';

/** One point of a sweep: its own Reynolds number and the full-scale drag area found there [m²]. */
export interface SweepPoint {
  readonly reynolds: number;
  readonly dragAreaM2: number;
}

/**
 * CdA = a + k·c_f(Re) by ordinary least squares, about the centroid: level ȳ at c̄ and slope k are uncorrelated, both of one
 * variance estimate s². Areas in m², c_f dimensionless.
 */
export interface SweepFit {
  readonly points: readonly SweepPoint[];
  /** c_f of each point. */
  readonly friction: readonly number[];
  /** c̄ and ȳ. */
  readonly meanFriction: number;
  readonly meanDragAreaM2: number;
  /** Σ(c − c̄)². */
  readonly frictionSquares: number;
  /** k. */
  readonly slopeM2: number;
  /** a. */
  readonly interceptM2: number;
  /** s: of one point about the line. */
  readonly residualStandardDeviationM2: number;
  /** u(k) = s/√S_xx. */
  readonly slopeUncertaintyM2: number;
  /** s/√n: of ȳ. */
  readonly levelUncertaintyM2: number;
  /** ν = n − 2. */
  readonly degreesOfFreedom: number;
  readonly lowestFriction: number;
  readonly highestFriction: number;
  readonly lowestReynolds: number;
  readonly highestReynolds: number;
}

const sum = (list: readonly number[]): number => list.reduce((total, value) => total + value, 0);

/**
 * Fits a sweep.
 *
 * @throws {Refused} sweep-too-few-points (under four), sweep-too-narrow (Re_max/Re_min < 1.5), reynolds-out-of-range
 */
export function fitSweep(points: readonly SweepPoint[], where = 'points'): SweepFit {
  const n = points.length;
  if (n < SWEEP_MIN_POINTS) {
    refuse('sweep-too-few-points', where, `A sweep needs ${SWEEP_MIN_POINTS} points, not ${n}.`);
  }
  const reynolds = points.map((point) => point.reynolds);
  const lowestReynolds = Math.min(...reynolds);
  const highestReynolds = Math.max(...reynolds);
  if (!(highestReynolds / lowestReynolds >= SWEEP_MIN_RATIO)) {
    refuse(
      'sweep-too-narrow',
      where,
      `The highest Reynolds number must be ${SWEEP_MIN_RATIO} times the lowest; it is ${(highestReynolds / lowestReynolds).toFixed(3)} times.`,
    );
  }
  const friction = reynolds.map((each) => skinFriction(each, where));
  const meanFriction = sum(friction) / n;
  const meanDragAreaM2 = sum(points.map((point) => point.dragAreaM2)) / n;
  let frictionSquares = 0;
  let products = 0;
  points.forEach(({ dragAreaM2 }, i) => {
    const c = (friction[i] ?? NaN) - meanFriction;
    frictionSquares += c * c;
    products += c * (dragAreaM2 - meanDragAreaM2);
  });
  const slopeM2 = products / frictionSquares;
  const squares = sum(
    points.map(
      ({ dragAreaM2 }, i) =>
        (dragAreaM2 - meanDragAreaM2 - slopeM2 * ((friction[i] ?? NaN) - meanFriction)) ** 2,
    ),
  );
  const residualStandardDeviationM2 = Math.sqrt(squares / (n - 2));
  return {
    points,
    friction,
    meanFriction,
    meanDragAreaM2,
    frictionSquares,
    slopeM2,
    interceptM2: meanDragAreaM2 - slopeM2 * meanFriction,
    residualStandardDeviationM2,
    slopeUncertaintyM2: residualStandardDeviationM2 / Math.sqrt(frictionSquares),
    levelUncertaintyM2: residualStandardDeviationM2 / Math.sqrt(n),
    degreesOfFreedom: n - 2,
    lowestFriction: Math.min(...friction),
    highestFriction: Math.max(...friction),
    lowestReynolds,
    highestReynolds,
  };
}

/**
 * c_f at a Reynolds number to or from which a figure is moved: no further from the sweep than its own span in c_f.
 *
 * @throws {Refused} sweep-extrapolation, reynolds-out-of-range
 */
export function frictionWithin(fit: SweepFit, reynolds: number, where: string): number {
  const friction = skinFriction(reynolds, where);
  const { lowestFriction, highestFriction } = fit;
  const span = highestFriction - lowestFriction;
  if (friction < lowestFriction - span || friction > highestFriction + span) {
    refuse(
      'sweep-extrapolation',
      where,
      `Re ${reynolds.toExponential(2)} lies further beyond the sweep (${fit.lowestReynolds.toExponential(2)} to ${fit.highestReynolds.toExponential(2)}) than its own span of skin friction.`,
    );
  }
  return friction;
}

/** The sweep's own figure at one Reynolds number: what a result takes whose own points are the sweep. */
export interface SweepPrediction {
  /** ȳ + k·(c_f − c̄) [m²]. */
  readonly dragAreaM2: number;
  /** s/√n and u(k)·(c_f − c̄), signed [m²]; both of one variance estimate. */
  readonly levelAmountM2: number;
  readonly slopeAmountM2: number;
  /** h_i: how much of each point the figure holds; they sum to 1. */
  readonly weights: readonly number[];
}

/** @throws {Refused} sweep-extrapolation, reynolds-out-of-range */
export function predictFromSweep(fit: SweepFit, reynolds: number, where: string): SweepPrediction {
  const distance = frictionWithin(fit, reynolds, where) - fit.meanFriction;
  return {
    dragAreaM2: fit.meanDragAreaM2 + fit.slopeM2 * distance,
    levelAmountM2: fit.levelUncertaintyM2,
    slopeAmountM2: fit.slopeUncertaintyM2 * distance,
    weights: fit.friction.map(
      (c) => 1 / fit.points.length + (distance * (c - fit.meanFriction)) / fit.frictionSquares,
    ),
  };
}

/** How far a result outside the sweep moves along it. */
export interface SweepMove {
  /** k·(c_f(Re_ref) − c_f(Re_test)) [m²]. */
  readonly shiftM2: number;
  /** u(k)·(c_f(Re_ref) − c_f(Re_test)) [m²], signed. */
  readonly amountM2: number;
}

/** @throws {Refused} sweep-extrapolation (either end), reynolds-out-of-range */
export function moveAlongSweep(
  fit: SweepFit,
  testReynolds: number,
  referenceReynolds: number,
  where: { readonly test: string; readonly reference: string },
): SweepMove {
  const distance =
    frictionWithin(fit, referenceReynolds, where.reference) - frictionWithin(fit, testReynolds, where.test);
  return { shiftM2: fit.slopeM2 * distance, amountM2: fit.slopeUncertaintyM2 * distance };
}

/** What a sweep says about lower Reynolds numbers. */
export interface SweepVerdict {
  /** The lowest Re from which CdA stays within the tolerance of that at the reference; never below the sweep's own lowest. */
  readonly lowestReynoldsWithinTolerance: number;
  /** Held at the sweep's lowest, or the slope is 0. */
  readonly lowestReynoldsIsSweepStart: boolean;
  /** |k|·|c_f(Re_i) − c_f(Re_ref)| ≤ tolerance at every point. */
  readonly flatWithinTolerance: boolean;
  /** Flat, and reaches above the minimum Reynolds number. */
  readonly clearsTransitionCaution: boolean;
}

/** @throws {Refused} reynolds-out-of-range (of the reference) */
export function judgeSweep(
  fit: SweepFit,
  referenceReynolds: number,
  toleranceM2: number,
  minimumReynolds: number,
): SweepVerdict {
  const reference = skinFriction(referenceReynolds, 'referenceReynolds');
  const steepness = Math.abs(fit.slopeM2);
  const reached = steepness === 0 ? 0 : reynoldsOfSkinFriction(reference + toleranceM2 / steepness);
  const isStart = !(reached > fit.lowestReynolds);
  const flat = fit.friction.every((c) => steepness * Math.abs(c - reference) <= toleranceM2);
  return {
    lowestReynoldsWithinTolerance: isStart ? fit.lowestReynolds : reached,
    lowestReynoldsIsSweepStart: isStart,
    flatWithinTolerance: flat,
    clearsTransitionCaution: flat && fit.highestReynolds > minimumReynolds,
  };
}
