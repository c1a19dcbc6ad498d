import { correlatedDragArea } from '../correlation/correlation';
import type { AppliedAdjustment, CorrelationStep, Reduction, ReductionContext } from '../reduction/reduction';
import { moveAlongFrictionLine } from '../similarity/friction-line';
import type { SweepFit } from '../similarity/reynolds-sweep';
import { skinFriction } from '../similarity/skin-friction';
import { stepOf, type DerivationStep } from './derivation';
import { inValues, joined } from './in-values';
import { REFERENCE_METHODS as METHODS } from './reference-methods';

/** Steps with the drag area that they end in [m²]. */
export interface StepsToFigure {
  readonly steps: readonly DerivationStep[];
  readonly dragAreaM2: number;
}

function frictionStep(testReynolds: number | null, context: ReductionContext): DerivationStep {
  const { referenceReynolds } = context;
  const reference = skinFriction(referenceReynolds);
  const test =
    testReynolds === null ? null : inValues`c_f(Re_test = ${testReynolds}) = ${skinFriction(testReynolds)}, `;
  return stepOf(METHODS.skinFriction, {
    values: inValues`${test}c_f(Re_ref = ${referenceReynolds}) = ${reference}`,
    value: reference,
    unit: '',
  });
}

function fitStep(fit: SweepFit, assumed: readonly string[]): DerivationStep {
  const points = fit.points.map(({ reynolds, dragAreaM2 }) => inValues`Re ${reynolds}: ${dragAreaM2} m²`);
  return stepOf(METHODS.sweepFit, {
    values: joined(
      [
        ...points,
        inValues`a = ${fit.interceptM2} m², k = ${fit.slopeM2} ± ${fit.slopeUncertaintyM2} m²`,
        inValues`s = ${fit.residualStandardDeviationM2} m², ν = ${fit.degreesOfFreedom}`,
      ],
      ', ',
    ),
    value: fit.slopeM2,
    unit: 'm²',
    assumed,
  });
}

function transitionWords(reduction: Reduction, context: ReductionContext): string[] {
  const { reynolds, output, parts } = reduction;
  if (reynolds.kind !== 'sweep' && reynolds.kind !== 'own-sweep') return [];
  const { minimumReynolds, reynoldsToleranceM2 } = context.policies;
  if (parts.scale >= 1 || output.reynolds === null || output.reynolds >= minimumReynolds) return [];
  return reynolds.verdict.clearsTransitionCaution
    ? [
        `the sweep reaches above the minimum Reynolds number and is flat within ${reynoldsToleranceM2} m²: transition is no doubt any more`,
      ]
    : [];
}

function reynoldsSteps(reduction: Reduction, context: ReductionContext, beforeM2: number): StepsToFigure {
  const { reynolds } = reduction;
  const { referenceReynolds, policies } = context;
  switch (reynolds.kind) {
    case 'replaced':
    case 'none':
      return { steps: [], dragAreaM2: beforeM2 };
    case 'friction-line': {
      if (!reynolds.applied) return { steps: [], dragAreaM2: beforeM2 };
      const move = moveAlongFrictionLine(beforeM2, reynolds.testReynolds, referenceReynolds, policies);
      const step = stepOf(METHODS.frictionLine, {
        values: inValues`${beforeM2} m² / (1 + ${policies.frictionShare} × ${move.frictionChange})`,
        value: move.dragAreaAtReferenceM2,
        unit: 'm²',
        assumed: [
          `a share of ${policies.frictionShare} ± ${policies.frictionShareU} of the drag is skin friction (${policies.policyId})`,
        ],
      });
      return {
        steps: [frictionStep(reynolds.testReynolds, context), step],
        dragAreaM2: move.dragAreaAtReferenceM2,
      };
    }
    case 'sweep': {
      const { sweep, fit, testReynolds, move } = reynolds;
      const dragAreaM2 = beforeM2 + move.shiftM2;
      const step = stepOf(METHODS.sweepMove, {
        values: inValues`${beforeM2} m² + ${fit.slopeM2} m² × (${skinFriction(referenceReynolds)} − ${skinFriction(testReynolds)})`,
        value: dragAreaM2,
        unit: 'm²',
        assumed: transitionWords(reduction, context),
      });
      const source = [`the result follows the sweep ${sweep.name ?? sweep.id}`];
      return {
        steps: [frictionStep(testReynolds, context), fitStep(fit, source), step],
        dragAreaM2,
      };
    }
    case 'own-sweep': {
      const { fit, prediction } = reynolds;
      const step = stepOf(METHODS.ownSweep, {
        values: inValues`${fit.meanDragAreaM2} m² + ${fit.slopeM2} m² × (${skinFriction(referenceReynolds)} − ${fit.meanFriction})`,
        value: prediction.dragAreaM2,
        unit: 'm²',
        assumed: transitionWords(reduction, context),
      });
      return {
        steps: [frictionStep(null, context), fitStep(fit, []), step],
        dragAreaM2: prediction.dragAreaM2,
      };
    }
  }
}

function adjustmentStep(applied: AppliedAdjustment, beforeM2: number): DerivationStep {
  const { adjustment, item, direction, stated, reference, deltaM2 } = applied;
  const named = adjustment.name ?? adjustment.id;
  const outcome = { value: beforeM2 + deltaM2, unit: 'm²' };
  if (direction === 'per-unit') {
    return stepOf(METHODS.adjustmentPerUnit, {
      ...outcome,
      values: inValues`${item}: ${beforeM2} m² + ${adjustment.perUnitDragAreaM2} m² × (${Number(reference)} − ${Number(stated)})`,
      assumed: [`the adjustment “${named}” holds for this body`],
    });
  }
  return stepOf(METHODS.adjustment, {
    ...outcome,
    values: inValues`${item}, ${String(stated)} to ${String(reference)}: ${beforeM2} m² + ${deltaM2} m²`,
    assumed: [
      `the adjustment “${named}” holds for this body${direction === 'backwards' ? ', used backwards' : ''}`,
    ],
  });
}

const REPLACED_WORDS = {
  blockage: 'the correlation stands for the blockage correction',
  reynolds: 'the correlation stands for the correction to the reference Reynolds number',
  groundSimulation: 'the correlation stands for ground, wheels and belt speed ratio: they were not compared',
} as const;

function correlationSteps(
  { correlation, fit }: CorrelationStep,
  context: ReductionContext,
  beforeM2: number,
): StepsToFigure {
  const { id, name, referenceFacilityId } = correlation.input;
  const dragAreaM2 = correlatedDragArea(fit, beforeM2, id);
  const { replaces } = correlation;
  const nu = fit.degreesOfFreedom === Infinity ? 'infinite' : fit.degreesOfFreedom;
  const reference = context.facilities.get(referenceFacilityId)?.name ?? referenceFacilityId;
  return {
    steps: [
      stepOf(METHODS.correlationFit, {
        values: inValues`${name ?? id}: n = ${fit.pairs.length}, a = ${fit.interceptM2} m², b = ${fit.slope} ± ${fit.slopeUncertainty}, level ± ${fit.levelUncertaintyM2} m² at ${fit.centroidM2} m², between pairs ${fit.betweenPairsStandardDeviationM2} m², widened ${fit.wideningFactor} times, ν = ${nu}, from ${fit.validFromM2} to ${fit.validToM2} m²`,
        value: fit.slope,
        unit: '',
        assumed: fit.offsetOnly ? ['fewer than five pairs: an offset alone, b = 1'] : [],
      }),
      stepOf(METHODS.correlation, {
        values: inValues`${fit.referenceCentroidM2} m² + ${fit.slope} × (${beforeM2} m² − ${fit.centroidM2} m²)`,
        value: dragAreaM2,
        unit: 'm²',
        assumed: [
          `the figure is that of ${reference}, with the bias of that facility`,
          ...(['blockage', 'reynolds', 'groundSimulation'] as const)
            .filter((step) => replaces[step])
            .map((step) => REPLACED_WORDS[step]),
        ],
      }),
    ],
    dragAreaM2,
  };
}

/** The steps from the full-scale drag area [m²] to the reference: Reynolds, condition, correlation, as far as they apply. */
export function referenceSteps(
  reduction: Reduction,
  context: ReductionContext,
  fullScaleM2: number,
): StepsToFigure {
  const toReynolds = reynoldsSteps(reduction, context, fullScaleM2);
  const steps = [...toReynolds.steps];
  let { dragAreaM2 } = toReynolds;
  for (const applied of reduction.condition.applied) {
    const step = adjustmentStep(applied, dragAreaM2);
    steps.push(step);
    dragAreaM2 = step.value;
  }
  if (reduction.correlation === null) return { steps, dragAreaM2 };
  const correlated = correlationSteps(reduction.correlation, context, dragAreaM2);
  return { steps: [...steps, ...correlated.steps], dragAreaM2: correlated.dragAreaM2 };
}
