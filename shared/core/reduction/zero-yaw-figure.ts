import { budgetOf, timesOf, type Amount, type KeyedFigure } from '../uncertainty/budget';
import { correctionAmounts } from './correction-amounts';
import { conditionAmounts, conditionStepOf } from './condition-step';
import { correlatedAmounts, correlationStepOf } from './correlation-step';
import { facilityAmounts } from './facility-amounts';
import type {
  ConditionStep,
  CorrelationStep,
  ReducedPoint,
  ReductionContext,
  ResultParts,
  ReynoldsStep,
} from './reduction';
import { afterReynolds, reynoldsAmounts, reynoldsDerivative, reynoldsStepOf } from './reynolds-step';

/** The steps from the zero-yaw points at full scale to the figure at the reference. */
export interface ReferenceFigure {
  readonly fullScaleM2: number | null;
  readonly reynolds: ReynoldsStep;
  /** Null where the step is not listed. */
  readonly afterReynoldsM2: number | null;
  readonly condition: ConditionStep;
  /** Null where no adjustment was applied. */
  readonly afterConditionM2: number | null;
  readonly correlation: CorrelationStep | null;
  readonly figure: KeyedFigure;
}

function meanDragArea(points: readonly ReducedPoint[]): number {
  let sum = 0;
  for (const point of points) sum += point.dragAreaM2;
  return sum / points.length;
}

/** Adds amounts times a factor to a list. */
function pushScaled(into: Amount[], amounts: readonly Amount[], factor: number): void {
  for (const entry of amounts) into.push(factor === 1 ? entry : timesOf(entry, factor));
}

/**
 * Carries the zero-yaw points through Reynolds, condition adjustments and facility correlation, in the order of method section
 * 0. An amount enters where it arises and is multiplied by the derivative of every later step.
 *
 * @throws {Refused} the codes of these steps, missing-input (no repeatability)
 */
export function referenceFigureOf(
  parts: ResultParts,
  points: readonly [ReducedPoint, ...ReducedPoint[]],
  context: ReductionContext,
): ReferenceFigure {
  const meanM2 = meanDragArea(points);
  const reynolds = reynoldsStepOf(parts, points, meanM2, context);
  const ownSweep = reynolds.kind === 'own-sweep' ? reynolds.prediction : null;
  const weights = ownSweep?.weights ?? null;
  const startM2 = ownSweep?.dragAreaM2 ?? meanM2;
  const afterReynoldsM2 = afterReynolds(reynolds, meanM2);
  const condition = conditionStepOf(parts, context);
  let dragAreaM2 = afterReynoldsM2 ?? meanM2;
  for (const { deltaM2 } of condition.applied) dragAreaM2 += deltaM2;
  const afterConditionM2 = condition.applied.length === 0 ? null : dragAreaM2;
  const correlation = correlationStepOf(parts, dragAreaM2);
  const derivative = reynoldsDerivative(reynolds);
  const beforeCorrelation: Amount[] = [];
  pushScaled(beforeCorrelation, correctionAmounts(parts, points, weights), derivative);
  pushScaled(beforeCorrelation, facilityAmounts(parts, points, startM2, weights), derivative);
  pushScaled(beforeCorrelation, reynoldsAmounts(reynolds, parts, context), 1);
  pushScaled(beforeCorrelation, conditionAmounts(condition), 1);
  return {
    fullScaleM2: ownSweep === null ? meanM2 : null,
    reynolds,
    afterReynoldsM2,
    condition,
    afterConditionM2,
    correlation,
    figure: {
      dragAreaM2: correlation?.dragAreaM2 ?? dragAreaM2,
      budget: budgetOf(
        correlation === null
          ? beforeCorrelation
          : correlatedAmounts(beforeCorrelation, correlation, parts, context),
      ),
    },
  };
}
