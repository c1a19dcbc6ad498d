import { COVERAGE_PROBABILITY, DEFAULT_POLICIES } from '../constants';
import { positive } from '../requirement';
import { studentQuantile } from '../uncertainty/student';
import {
  fitSweep,
  judgeSweep,
  moveAlongSweep,
  predictFromSweep,
  type SweepFit,
  type SweepPoint,
  type SweepVerdict,
} from './reynolds-sweep';

/** Input of the operation `reynolds-sweep`; areas in m² at full scale. */
export interface ReynoldsSweepInput {
  readonly points: readonly SweepPoint[];
  readonly referenceReynolds: number;
  readonly toleranceM2: number;
  readonly minimumReynolds?: number | null | undefined;
  /** A result outside the sweep that is to be moved along it. */
  readonly result?: SweepPoint | null | undefined;
}

/** Output of the operation `reynolds-sweep`; U = t·u with the Student quantile at 0.97725 for ν = n − 2. */
export interface ReynoldsSweepOutput extends SweepVerdict {
  readonly interceptM2: number;
  readonly slopeM2: number;
  readonly interceptStandardErrorM2: number;
  readonly slopeStandardErrorM2: number;
  readonly interceptVarianceM4: number;
  readonly slopeVarianceM4: number;
  readonly covarianceM4: number;
  readonly residualStandardDeviationM2: number;
  readonly degreesOfFreedom: number;
  readonly coverageFactor: number;
  readonly interceptExpandedUncertaintyM2: number;
  readonly slopeExpandedUncertaintyM2: number;
  readonly predictionAtReferenceM2: number;
  readonly predictionStandardUncertaintyM2: number;
  readonly predictionExpandedUncertaintyM2: number;
  readonly predictionLevelAmountM2: number;
  readonly predictionSlopeAmountM2: number;
  readonly movedResult?: {
    readonly shiftM2: number;
    readonly dragAreaM2: number;
    readonly signedAmountM2: number;
  };
}

function coefficientsOf(fit: SweepFit, coverageFactor: number) {
  const variance = fit.residualStandardDeviationM2 ** 2;
  const interceptVarianceM4 =
    variance * (1 / fit.points.length + fit.meanFriction ** 2 / fit.frictionSquares);
  const interceptStandardErrorM2 = Math.sqrt(interceptVarianceM4);
  return {
    interceptM2: fit.interceptM2,
    slopeM2: fit.slopeM2,
    interceptStandardErrorM2,
    slopeStandardErrorM2: fit.slopeUncertaintyM2,
    interceptVarianceM4,
    slopeVarianceM4: variance / fit.frictionSquares,
    covarianceM4: (-variance * fit.meanFriction) / fit.frictionSquares,
    residualStandardDeviationM2: fit.residualStandardDeviationM2,
    degreesOfFreedom: fit.degreesOfFreedom,
    coverageFactor,
    interceptExpandedUncertaintyM2: coverageFactor * interceptStandardErrorM2,
    slopeExpandedUncertaintyM2: coverageFactor * fit.slopeUncertaintyM2,
  };
}

/**
 * The operation `reynolds-sweep`: the fit with its standard errors, the figure at the reference, what the sweep says about
 * lower Reynolds numbers, and a result moved along it.
 *
 * @throws {Refused} sweep-too-few-points, sweep-too-narrow, sweep-extrapolation, reynolds-out-of-range, not-positive
 */
export function evaluateReynoldsSweep(input: ReynoldsSweepInput): ReynoldsSweepOutput {
  const { referenceReynolds, toleranceM2, result } = input;
  positive(toleranceM2, 'toleranceM2');
  const fit = fitSweep(input.points);
  const prediction = predictFromSweep(fit, referenceReynolds, 'referenceReynolds');
  const coverageFactor = studentQuantile(COVERAGE_PROBABILITY, fit.degreesOfFreedom);
  const u = Math.hypot(prediction.levelAmountM2, prediction.slopeAmountM2);
  const move =
    result == null
      ? null
      : moveAlongSweep(fit, result.reynolds, referenceReynolds, {
          test: 'result.reynolds',
          reference: 'referenceReynolds',
        });
  return {
    ...coefficientsOf(fit, coverageFactor),
    predictionAtReferenceM2: prediction.dragAreaM2,
    predictionStandardUncertaintyM2: u,
    predictionExpandedUncertaintyM2: coverageFactor * u,
    predictionLevelAmountM2: prediction.levelAmountM2,
    predictionSlopeAmountM2: prediction.slopeAmountM2,
    ...judgeSweep(
      fit,
      referenceReynolds,
      toleranceM2,
      input.minimumReynolds ?? DEFAULT_POLICIES.minimumReynolds,
    ),
    ...(result != null &&
      move !== null && {
        movedResult: {
          shiftM2: move.shiftM2,
          dragAreaM2: result.dragAreaM2 + move.shiftM2,
          signedAmountM2: move.amountM2,
        },
      }),
  };
}
