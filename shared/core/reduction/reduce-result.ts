import type { LiftAndSide, ReducedResult, ReductionStep } from '../ranking/ranking-output';
import type { PointInput, ResultInput } from '../ranking/ranking-input';
import { refuse } from '../refusal';
import { figureOf, type KeyedFigure } from '../uncertainty/budget';
import { liftAndSideOf } from './lift-and-side';
import { reducePoints } from './reduce-point';
import type {
  ConditionStep,
  CorrelationStep,
  ReducedPoint,
  Reduction,
  ReductionContext,
  ResultParts,
  ReynoldsStep,
  WindAverage,
} from './reduction';
import { needed, resultPartsOf } from './result-parts';
import { sameSpeed, windAveragedUncertainty, windAverageOf } from './result-wind-average';
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
    windAveragedStandardUncertaintyM2:
      windAverage.yaw === null ? null : windAveragedUncertainty(result.id, reference.figure, windAverage.yaw),
    windAveragedRefusal: windAverage.refusal,
    liftAndSide,
    cautions,
    excludedBy,
  };
}

/** What a reduction goes through on its way. */
interface Passed {
  readonly points: readonly ReducedPoint[];
  readonly zeroYawPoints: ZeroYawPoints;
  readonly reference: ReferenceFigure;
}

function passThrough(parts: ResultParts, context: ReductionContext): Passed {
  const points = reducePoints(pointsOf(parts.result), parts, context);
  const zeroYawPoints = zeroYawPointsOf(points, parts);
  return { points, zeroYawPoints, reference: referenceFigureOf(parts, zeroYawPoints, context) };
}

/**
 * A reduction as it is kept: figures and verdicts. Of thousands of results few are opened, so the points and the Reynolds step
 * are not held but gone through again, by the same functions, when somebody looks at them.
 */
class KeptReduction implements Reduction {
  readonly fullScaleM2: number | null;
  readonly condition: ConditionStep;
  readonly correlation: CorrelationStep | null;
  readonly zeroYaw: KeyedFigure;
  private again: Passed | null = null;

  constructor(
    readonly parts: ResultParts,
    private readonly context: ReductionContext,
    reference: ReferenceFigure,
    readonly windAverage: WindAverage,
    readonly output: ReducedResult,
  ) {
    this.fullScaleM2 = reference.fullScaleM2;
    this.condition = reference.condition;
    this.correlation = reference.correlation;
    this.zeroYaw = reference.figure;
  }

  private get passed(): Passed {
    this.again ??= passThrough(this.parts, this.context);
    return this.again;
  }

  get points(): readonly ReducedPoint[] {
    return this.passed.points;
  }

  get zeroYawPoints(): readonly ReducedPoint[] {
    return this.passed.zeroYawPoints;
  }

  get reynolds(): ReynoldsStep {
    return this.passed.reference.reynolds;
  }
}

/**
 * Brings one result to the programme's reference, step by step in the order of method section 0.
 *
 * @throws {Refused} with the code that refuses this result by itself
 */
export function reduceResult(result: ResultInput, context: ReductionContext): Reduction {
  const parts = resultPartsOf(result, context);
  const { points, zeroYawPoints, reference } = passThrough(parts, context);
  const windAverage = windAverageOf(parts, points, reference.figure, context);
  const liftAndSide = liftAndSideOf(pointsOf(result), points, parts);
  const output = outputOf(parts, points, zeroYawPoints[0], reference, windAverage, liftAndSide, context);
  return new KeptReduction(parts, context, reference, windAverage, output);
}
