import { combine, type Combination } from '../combination/combination';
import type { Basis } from '../ranking/ranking-input';
import type { Reduction, ReductionContext } from '../reduction/reduction';
import { refuse } from '../refusal';
import { figureOf, type KeyedFigure } from '../uncertainty/budget';
import { COMBINATION_METHODS as METHODS } from './combination-methods';
import { stepOf, type Derivation, type DerivationStep } from './derivation';
import { inValues, joined } from './in-values';
import type { KeyNames } from './key-labels';
import { budgetShares, traceOfReduction, uncertaintyStep } from './trace-of-figure';

/** Results of one variant with their mean on a basis, in the order of its weights. */
interface CombinedResults {
  readonly reductions: readonly Reduction[];
  readonly figures: readonly KeyedFigure[];
  readonly combination: Combination;
}

/** @throws {Refused} the code why a result has no wind average */
function figureOn(basis: Basis, { zeroYaw, windAverage, output }: Reduction): KeyedFigure {
  if (basis === 'zero-yaw') return zeroYaw;
  if (windAverage.figure !== null) return windAverage.figure;
  return refuse(windAverage.refusal, `result:${output.resultId}`, 'There is no wind average of this result.');
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

function meanStep({ reductions, figures, combination }: CombinedResults): DerivationStep {
  const parts = reductions.map(
    (reduction, i) =>
      inValues`${combination.weights[i]} × ${figures[i]?.dragAreaM2} m² (${resultName(reduction)})`,
  );
  return stepOf(METHODS.weightedMean, {
    values: joined(parts, ' + '),
    value: combination.figure.dragAreaM2,
    unit: 'm²',
  });
}

function agreementSteps({ reductions, combination }: CombinedResults): readonly DerivationStep[] {
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
 * The derivation of a weighted mean of a variant's results, given oldest first as the ranking uses them: every result from its raw value to the
 * reference, then the mean, how the results agree, and the budget.
 *
 * @throws {Refused} nothing-to-combine, uncertainty-zero, the code why a result has no wind average where that basis is asked for
 */
export function traceOfCombination(
  variantId: string,
  reductions: readonly Reduction[],
  context: ReductionContext,
  basis: Basis,
  names: KeyNames,
): Derivation {
  const figures = reductions.map((reduction) => figureOn(basis, reduction));
  const combined = { reductions, figures, combination: combine(figures, variantId) };
  const keyed = combined.combination.figure;
  const figure = figureOf(keyed);
  const count = `${reductions.length} ${reductions.length === 1 ? 'result' : 'results'}`;
  const inWords = basis === 'wind-averaged' ? 'wind-averaged' : 'zero yaw';
  return {
    title: `Drag area C_D·A of ${names.get(variantId) ?? variantId}, weighted mean of ${count}, ${inWords}`,
    value: figure.dragAreaM2,
    unit: 'm²',
    standardUncertainty: figure.standardUncertaintyM2,
    expandedUncertainty: figure.expandedUncertaintyM2,
    coverageFactor: figure.coverageFactor,
    steps: [
      ...reductions.flatMap((reduction) => stepsOfResult(reduction, context, basis, names)),
      meanStep(combined),
      ...agreementSteps(combined),
      uncertaintyStep(keyed),
    ],
    budget: budgetShares(figure.contributions, names),
  };
}
