import { refuse } from '../refusal';
import { moveAlongFrictionLine } from '../similarity/friction-line';
import {
  fitSweep,
  judgeSweep,
  moveAlongSweep,
  predictFromSweep,
  type SweepPoint,
} from '../similarity/reynolds-sweep';
import { amount, type Amount } from '../uncertainty/budget';
import type { ReducedPoint, ReductionContext, ResultParts, ReynoldsStep } from './reduction';
import { needed } from './result-parts';

const SWEEP_PREFIX = 'sweep:';

/** Whether a result's own zero-yaw points are its sweep; not where its correlation replaces Reynolds. */
export function restsOnOwnSweep({ result, replaced }: ResultParts): boolean {
  return result.reynoldsMethod === 'own-sweep' && !replaced.reynolds;
}

/** Zero-yaw points as a sweep: each reduced on its own, at its own speed. @throws {Refused} missing-input (no air or speed) */
export function asSweep(points: readonly ReducedPoint[]): SweepPoint[] {
  return points.map(({ reynolds, dragAreaM2 }) => ({ reynolds: needed(reynolds, 'speedKmh'), dragAreaM2 }));
}

function ownSweep(points: readonly ReducedPoint[], context: ReductionContext): ReynoldsStep {
  const { referenceReynolds, policies } = context;
  const fit = fitSweep(asSweep(points), 'points');
  return {
    kind: 'own-sweep',
    fit,
    prediction: predictFromSweep(fit, referenceReynolds, 'programme.referenceSpeedKmh'),
    verdict: judgeSweep(fit, referenceReynolds, policies.reynoldsToleranceM2, policies.minimumReynolds),
  };
}

function otherSweep(sweepId: string, testReynolds: number, context: ReductionContext): ReynoldsStep {
  const sweep =
    context.sweeps.get(sweepId) ??
    refuse('unknown-sweep', 'reynoldsMethod', `There is no Reynolds sweep “${sweepId}”.`);
  const { referenceReynolds } = context;
  const fit = sweep.fit();
  return {
    kind: 'sweep',
    sweep,
    fit,
    testReynolds,
    move: moveAlongSweep(fit, testReynolds, referenceReynolds, {
      test: 'points',
      reference: 'programme.referenceSpeedKmh',
    }),
    verdict: sweep.verdict(),
  };
}

function frictionLine(dragAreaM2: number, testReynolds: number, context: ReductionContext): ReynoldsStep {
  const { policies, referenceReynolds } = context;
  const applied = policies.frictionLine === 'on';
  if (!applied && policies.frictionShare === 0 && policies.frictionShareU === 0) return { kind: 'none' };
  return {
    kind: 'friction-line',
    applied,
    testReynolds,
    move: moveAlongFrictionLine(dragAreaM2, testReynolds, referenceReynolds, policies),
  };
}

/**
 * How a result gets to the reference Reynolds number: by its own sweep, along another, along the friction line, or not at all.
 *
 * @param dragAreaM2 of the zero-yaw points at full scale; not used by an own sweep
 * @throws {Refused} unknown-sweep, unknown-method, and the codes of the operation reynolds-sweep
 */
export function reynoldsStepOf(
  parts: ResultParts,
  points: readonly [ReducedPoint, ...ReducedPoint[]],
  dragAreaM2: number,
  context: ReductionContext,
): ReynoldsStep {
  if (parts.replaced.reynolds) return { kind: 'replaced' };
  const method = parts.result.reynoldsMethod ?? 'friction-line';
  if (method === 'own-sweep') return ownSweep(points, context);
  const testReynolds = needed(points[0].reynolds, 'speedKmh');
  if (method === 'friction-line') return frictionLine(dragAreaM2, testReynolds, context);
  if (method.startsWith(SWEEP_PREFIX)) {
    return otherSweep(method.slice(SWEEP_PREFIX.length), testReynolds, context);
  }
  return refuse('unknown-method', 'reynoldsMethod', `There is no Reynolds method “${method}”.`);
}

/** The drag area after the step [m²]; null where it is not listed and the drag area stays. */
export function afterReynolds(step: ReynoldsStep, dragAreaM2: number): number | null {
  switch (step.kind) {
    case 'replaced':
    case 'none':
      return null;
    case 'friction-line':
      return step.applied ? step.move.dragAreaAtReferenceM2 : null;
    case 'sweep':
      return dragAreaM2 + step.move.shiftM2;
    case 'own-sweep':
      return step.prediction.dragAreaM2;
  }
}

/** d(after)/d(before): what every earlier amount is multiplied by. */
export function reynoldsDerivative(step: ReynoldsStep): number {
  return step.kind === 'friction-line' && step.applied ? step.move.derivative : 1;
}

/** What the step itself adds [m²], signed (method section 6). */
export function reynoldsAmounts(
  step: ReynoldsStep,
  { result, variant }: ResultParts,
  { policies }: ReductionContext,
): Amount[] {
  switch (step.kind) {
    case 'replaced':
    case 'none':
      return [];
    case 'friction-line': {
      const { frictionShareAmountM2, reynoldsShapeAmountM2 } = step.move;
      return [
        // Switched off, the whole omitted correction is what is not known; half of it is the shape's in either case.
        amount(
          `friction-share:${policies.policyId}`,
          step.applied ? frictionShareAmountM2 : 2 * reynoldsShapeAmountM2,
        ),
        amount(`reynolds-shape:${variant.id}`, reynoldsShapeAmountM2),
      ];
    }
    case 'sweep':
      return [amount(`sweep:${step.sweep.id}`, step.move.amountM2, step.fit.degreesOfFreedom)];
    case 'own-sweep': {
      const { levelAmountM2, slopeAmountM2 } = step.prediction;
      const { degreesOfFreedom } = step.fit;
      const estimate = `sweep:${result.id}`;
      return [
        amount(`sweep-level:${result.id}`, levelAmountM2, degreesOfFreedom, estimate),
        amount(estimate, slopeAmountM2, degreesOfFreedom),
      ];
    }
  }
}

/** Whether the sweep that the result itself uses clears the caution about transition. */
export function clearsTransition(step: ReynoldsStep): boolean {
  return (step.kind === 'sweep' || step.kind === 'own-sweep') && step.verdict.clearsTransitionCaution;
}
