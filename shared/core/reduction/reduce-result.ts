import type { LiftAndSide, ReducedResult, ReductionStep } from '../ranking/ranking-output';
import type { PointInput, ResultInput } from '../ranking/ranking-input';
import { refuse } from '../refusal';
import { figureOf, standardUncertainty } from '../uncertainty/budget';
import { liftAndSideOf } from './lift-and-side';
import { reducePoints } from './reduce-point';
import type { ReducedPoint, Reduction, ReductionContext, ResultParts, WindAverage } from './reduction';
import { needed, resultPartsOf } from './result-parts';
import { sameSpeed, windAverageOf } from './result-wind-average';
import { restsOnOwnSweep } from './reynolds-step';
import { verdictsOf } from './verdicts';
import { isZeroYaw } from './yaw/yaw-points';
import { referenceFigureOf, type ReferenceFigure } from './zero-yaw-figure';

function pointsOf(result: ResultInput): readonly PointInput[] {
  const points = needed(result.points, 'points');
  if (points.length === 0) refuse('missing-input', 'points', 'The result has no point.');
  return points;
}

type ZeroYawPoints = readonly [ReducedPoint, ...ReducedPoint[]];

function zeroYawPointsOf(points: readonly ReducedPoint[], parts: ResultParts): ZeroYawPoints {
  const [first, ...rest] = points.filter((point) => isZeroYaw(point.yawDeg));
  if (first === undefined) refuse('yaw-no-zero', 'points', 'There is no point at zero yaw.');
  if (!restsOnOwnSweep(parts) && rest.some((point) => !sameSpeed(point, first))) {
    refuse('zero-yaw-mixed-speeds', 'points', 'The zero-yaw points were taken at several speeds.');
  }
  return [first, ...rest];
}

/** The drag area after each step that is listed; a later step that does not apply is not. */
function stepsOf(reference: ReferenceFigure): ReductionStep[] {
  const { fullScaleM2, afterReynoldsM2, afterConditionM2, correlation } = reference;
  const steps: ReductionStep[] = [{ step: 'full-scale-drag-area', dragAreaM2: fullScaleM2 }];
  if (afterReynoldsM2 !== null) steps.push({ step: 'reynolds', dragAreaM2: afterReynoldsM2 });
  if (afterConditionM2 !== null) steps.push({ step: 'condition-adjustments', dragAreaM2: afterConditionM2 });
  if (correlation !== null) steps.push({ step: 'facility-correlation', dragAreaM2: correlation.dragAreaM2 });
  return steps;
}

/** The highest Mach number of the points; null where none is known. */
function highestMach(points: readonly ReducedPoint[]): number | null {
  let highest: number | null = null;
  for (const { mach } of points) {
    if (mach !== null && (highest === null || mach > highest)) highest = mach;
  }
  return highest;
}

function outputOf(
  parts: ResultParts,
  points: readonly ReducedPoint[],
  first: ReducedPoint,
  reference: ReferenceFigure,
  windAverage: WindAverage,
  liftAndSide: readonly LiftAndSide[],
  context: ReductionContext,
): ReducedResult {
  const { result, tunnel } = parts;
  const mach = highestMach(points);
  const { reynolds: reynoldsStep, condition } = reference;
  const wind = windAverage.figure;
  const reynolds = reynoldsStep.kind === 'own-sweep' ? reynoldsStep.fit.lowestReynolds : first.reynolds;
  const { cautions, excludedBy } = verdictsOf(
    { parts, mach, reynolds, reynoldsStep, condition, windAverage },
    context,
  );
  return {
    resultId: result.id,
    variantId: result.variantId,
    reynolds,
    mach,
    blockageRatio: tunnel?.blockageRatio ?? null,
    dynamicPressurePa: result.quantity === 'force' ? first.flow.dynamicPressurePa : null,
    modelDragAreaM2: first.modelDragAreaM2,
    blockageCorrectedModelDragAreaM2: first.blockage.modelDragAreaM2,
    steps: stepsOf(reference),
    yawRatio: windAverage.yaw?.yawRatio ?? null,
    zeroYaw: figureOf(reference.figure),
    windAveragedDragAreaM2: wind?.dragAreaM2 ?? null,
    windAveragedStandardUncertaintyM2: wind === null ? null : standardUncertainty(wind.budget),
    windAveragedRefusal: windAverage.refusal,
    liftAndSide,
    cautions,
    excludedBy,
  };
}

/**
 * Brings one result to the programme's reference, step by step in the order of method section 0.
 *
 * @throws {Refused} with the code that refuses this result by itself
 */
export function reduceResult(result: ResultInput, context: ReductionContext): Reduction {
  const parts = resultPartsOf(result, context);
  const given = pointsOf(result);
  const points = reducePoints(given, parts, context);
  const zeroYawPoints = zeroYawPointsOf(points, parts);
  const reference = referenceFigureOf(parts, zeroYawPoints, context);
  const windAverage = windAverageOf(parts, points, reference.figure, context);
  const liftAndSide = liftAndSideOf(given, points, parts);
  return {
    parts,
    points,
    zeroYawPoints,
    fullScaleM2: reference.fullScaleM2,
    reynolds: reference.reynolds,
    condition: reference.condition,
    correlation: reference.correlation,
    zeroYaw: reference.figure,
    windAverage,
    output: outputOf(parts, points, zeroYawPoints[0], reference, windAverage, liftAndSide, context),
  };
}
