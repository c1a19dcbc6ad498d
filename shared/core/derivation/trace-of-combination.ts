import type { Combination } from '../combination/combination';
import type { Basis } from '../ranking/ranking-input';
import type { Reduction, ReductionContext } from '../reduction/reduction';
import { figureOf } from '../uncertainty/budget';
import { COMBINATION_METHODS as METHODS } from './combination-methods';
import { stepOf, type Derivation, type DerivationStep } from './derivation';
import { inValues, joined } from './in-values';
import type { KeyNames } from './key-labels';
import { budgetShares, traceOfReduction, uncertaintyStep } from './trace-of-figure';

/** A weighted mean at hand: the results that it used, in the order of its weights. */
export interface CombinedEvidence {
  readonly variantId: string;
  readonly reductions: readonly Reduction[];
  readonly combination: Combination;
}

const resultName = ({ parts: { result } }: Reduction): string => result.name ?? result.id;

/** The steps of one result, each said to be its own; the budget of the mean stands for all. */
function stepsOfResult(
  reduction: Reduction,
  context: ReductionContext,
  basis: Basis,
  names: KeyNames,
): readonly DerivationStep[] {
  const { steps } = traceOfReduction(reduction, context, basis, names);
  return steps.slice(0, -1).map((step) => ({ ...step, title: `${resultName(reduction)}: ${step.title}` }));
}

function meanStep({ reductions, combination }: CombinedEvidence, basis: Basis): DerivationStep {
  const parts = reductions.map((reduction, i) => {
    const figure = basis === 'wind-averaged' ? reduction.windAverage.figure : reduction.zeroYaw;
    return inValues`${combination.weights[i]} × ${figure?.dragAreaM2} m² (${resultName(reduction)})`;
  });
  return stepOf(METHODS.weightedMean, {
    values: joined(parts, ' + '),
    value: combination.figure.dragAreaM2,
    unit: 'm²',
  });
}

function agreementSteps({ reductions, combination }: CombinedEvidence): readonly DerivationStep[] {
  const { birgeRatio, chiSquared, betweenResultsVarianceM4, randomEffectsMeanM2 } = combination;
  if (birgeRatio === null) return [];
  return [
    stepOf(METHODS.birgeRatio, {
      values: inValues`χ² = ${chiSquared}, n = ${reductions.length}`,
      value: birgeRatio,
      unit: '',
      cautions:
        birgeRatio > 1
          ? [
              'the results scatter more than their own uncertainties say, and no key describes it; the mean is widened, which covers about 90 %',
            ]
          : [],
    }),
    stepOf(METHODS.randomEffects, {
      values: inValues`τ² = ${betweenResultsVarianceM4} m⁴, standard error ${combination.randomEffectsStandardErrorM2} m²`,
      value: randomEffectsMeanM2,
      unit: 'm²',
    }),
  ];
}

/**
 * The derivation of a weighted mean: every result from its raw value to the reference, then the mean, how the results agree, and the budget.
 *
 * @throws {Refused} the code why a result has no wind average, where that basis is asked for
 */
export function traceOfCombination(
  evidence: CombinedEvidence,
  context: ReductionContext,
  basis: Basis,
  names: KeyNames,
): Derivation {
  const { combination, reductions, variantId } = evidence;
  const figure = figureOf(combination.figure);
  const results = reductions.flatMap((reduction) => stepsOfResult(reduction, context, basis, names));
  return {
    title: `Drag area C_D·A of ${names.get(variantId) ?? variantId}, weighted mean of ${reductions.length} ${
      reductions.length === 1 ? 'result' : 'results'
    }, ${basis === 'wind-averaged' ? 'wind-averaged' : 'zero yaw'}`,
    value: figure.dragAreaM2,
    unit: 'm²',
    standardUncertainty: figure.standardUncertaintyM2,
    expandedUncertainty: figure.expandedUncertaintyM2,
    coverageFactor: figure.coverageFactor,
    steps: [
      ...results,
      meanStep(evidence, basis),
      ...agreementSteps(evidence),
      uncertaintyStep(combination.figure),
    ],
    budget: budgetShares(figure.contributions, names),
  };
}
