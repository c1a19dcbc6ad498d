import type { ExclusionRule, LiftAndSide, ReducedResult, ReductionCaution } from '../ranking/ranking-output';
import type { PointInput, ResultInput } from '../ranking/ranking-input';
import { refuse } from '../refusal';
import { differingItems } from '../similarity/condition';
import { machVerdict } from '../similarity/flow';
import { budgetOf, figureOf, standardUncertainty, type KeyedFigure } from '../uncertainty/budget';
import { blockageVerdict } from './blockage';
import { facilityAmounts } from './facility-amounts';
import { liftAndSideOf } from './lift-and-side';
import { meanAmounts, reducePoint } from './reduce-point';
import type { ReducedPoint, Reduction, ReductionContext, ResultParts, WindAverage } from './reduction';
import { isTunnel, needed, resultPartsOf } from './result-parts';
import { sameSpeed, windAverageOf } from './result-wind-average';
import { isZeroYaw } from './yaw/yaw-points';

function pointsOf(result: ResultInput): readonly PointInput[] {
  const points = needed(result.points, 'points');
  if (points.length === 0) refuse('missing-input', 'points', 'The result has no point.');
  return points;
}

function zeroYawPointsOf(points: readonly ReducedPoint[]): readonly [ReducedPoint, ...ReducedPoint[]] {
  const [first, ...rest] = points.filter((point) => isZeroYaw(point.yawDeg));
  if (first === undefined) refuse('yaw-no-zero', 'points', 'There is no point at zero yaw.');
  if (rest.some((point) => !sameSpeed(point, first))) {
    refuse('zero-yaw-mixed-speeds', 'points', 'The zero-yaw points were taken at several speeds.');
  }
  return [first, ...rest];
}

function zeroYawFigure(parts: ResultParts, points: readonly ReducedPoint[]): KeyedFigure {
  const dragAreaM2 = points.reduce((sum, point) => sum + point.dragAreaM2, 0) / points.length;
  return {
    dragAreaM2,
    budget: budgetOf([...meanAmounts(points), ...facilityAmounts(parts, points, dragAreaM2)]),
  };
}

interface Verdicts {
  readonly cautions: readonly ReductionCaution[];
  readonly excludedBy: readonly ExclusionRule[];
}

function verdictsOf(
  parts: ResultParts,
  mach: number,
  reynolds: number,
  windAverage: WindAverage,
  context: ReductionContext,
): Verdicts {
  const { result, facility, tunnel, scale, air } = parts;
  const { policies } = context;
  const cautions = new Set<ReductionCaution>([...air.notes, ...(windAverage.yaw?.cautions ?? [])]);
  const excludedBy: ExclusionRule[] = [];
  const byMach = machVerdict(mach, policies);
  if (byMach === 'caution') cautions.add('mach');
  if (byMach === 'excluded') excludedBy.push('mach');
  if (tunnel !== null && isTunnel(facility.kind)) {
    const byBlockage = blockageVerdict(facility.kind, tunnel.blockageRatio, policies);
    if (byBlockage === 'caution') cautions.add('blockage');
    if (byBlockage === 'excluded') excludedBy.push('blockage');
  }
  if (scale < 1 && reynolds < policies.minimumReynolds && result.turbulenceGenerationOrTrips !== true) {
    cautions.add('transition');
  }
  if (differingItems(context.referenceCondition, result.condition).length > 0)
    excludedBy.push('not-comparable');
  return { cautions: [...cautions].sort(), excludedBy };
}

function outputOf(
  parts: ResultParts,
  points: readonly ReducedPoint[],
  first: ReducedPoint,
  zeroYaw: KeyedFigure,
  windAverage: WindAverage,
  liftAndSide: readonly LiftAndSide[],
  context: ReductionContext,
): ReducedResult {
  const { result, tunnel } = parts;
  const mach = Math.max(...points.map((point) => point.mach));
  return {
    resultId: result.id,
    variantId: result.variantId,
    reynolds: first.reynolds,
    mach,
    blockageRatio: tunnel?.blockageRatio ?? null,
    dynamicPressurePa: result.quantity === 'force' ? first.flow.dynamicPressurePa : null,
    modelDragAreaM2: first.modelDragAreaM2,
    blockageCorrectedModelDragAreaM2: first.blockage.modelDragAreaM2,
    steps: [{ step: 'full-scale-drag-area', dragAreaM2: zeroYaw.dragAreaM2 }],
    yawRatio: windAverage.yaw?.yawRatio ?? null,
    zeroYaw: figureOf(zeroYaw),
    windAveragedDragAreaM2: windAverage.figure?.dragAreaM2 ?? null,
    windAveragedStandardUncertaintyM2:
      windAverage.figure === null ? null : standardUncertainty(windAverage.figure.budget),
    windAveragedRefusal: windAverage.refusal,
    liftAndSide,
    ...verdictsOf(parts, mach, first.reynolds, windAverage, context),
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
  const points = given.map((point) => reducePoint(point, parts, context));
  const zeroYawPoints = zeroYawPointsOf(points);
  const zeroYaw = zeroYawFigure(parts, zeroYawPoints);
  const windAverage = windAverageOf(parts, points, zeroYaw, context);
  const liftAndSide = liftAndSideOf(given, points, parts);
  return {
    parts,
    points,
    zeroYawPoints,
    zeroYaw,
    windAverage,
    output: outputOf(parts, points, zeroYawPoints[0], zeroYaw, windAverage, liftAndSide, context),
  };
}
