import type { Basis, RankingInput } from '../ranking/ranking-input';
import { reduceResult } from '../reduction/reduce-result';
import type { Reduction, ReductionContext } from '../reduction/reduction';
import { reductionContextOf } from '../reduction/reduction-context';
import { refuse } from '../refusal';
import { figureOf, type KeyedFigure } from '../uncertainty/budget';
import type { Contribution } from '../uncertainty/figure';
import { stepOf, type BudgetShare, type Derivation, type DerivationStep } from './derivation';
import { inValues, joined, plain } from './in-values';
import { keyLabel, type KeyNames } from './key-labels';
import { REDUCTION_METHODS as METHODS } from './reduction-methods';
import { zeroYawSteps } from './reduction-steps';

/** A budget in words, largest share first; amounts times a factor where the figure is not a drag area. */
export function budgetShares(
  contributions: readonly Contribution[],
  names: KeyNames,
  factor = 1,
): BudgetShare[] {
  return contributions
    .map(({ key, amountM2, degreesOfFreedom, shareOfVariance }) => ({
      key,
      label: keyLabel(key, names),
      amount: amountM2 * factor,
      degreesOfFreedom,
      shareOfVariance,
    }))
    .sort((a, b) => b.shareOfVariance - a.shareOfVariance);
}

function namesIn(input: RankingInput): KeyNames {
  const { facilities, models, variants, results, sweeps, adjustments, correlations } = input;
  const named = [
    ...(sweeps ?? []),
    ...(adjustments ?? []),
    ...(correlations ?? []),
    ...facilities,
    ...(models ?? []),
    ...variants,
    ...results,
  ];
  return new Map(named.flatMap(({ id, name }) => (name == null ? [] : [[id, name] as const])));
}

function windSteps({ windAverage, output }: Reduction, zeroYawM2: number): DerivationStep[] {
  const { yaw } = windAverage;
  if (yaw === null) {
    return refuse(
      windAverage.refusal,
      `result:${output.resultId}`,
      'There is no wind average of this result.',
    );
  }
  const points = yaw.foldedYawDeg.map((angle, i) => inValues`${angle}°: ${yaw.foldedDragAreaM2[i]} m²`);
  return [
    stepOf(METHODS.yawRatio, {
      values: joined(points, ', '),
      value: yaw.yawRatio,
      unit: '',
      assumed: ['the wind comes from every direction alike'],
      cautions: yaw.cautions.map(
        () => 'an angle was measured on one side only, and the body is not symmetrical',
      ),
    }),
    stepOf(METHODS.windAveraged, {
      values: inValues`${yaw.yawRatio} × ${zeroYawM2} m²`,
      value: zeroYawM2 * yaw.yawRatio,
      unit: 'm²',
    }),
  ];
}

/** The last step of every derivation of a drag area: u, t and U. */
export function uncertaintyStep(figure: KeyedFigure): DerivationStep {
  const { standardUncertaintyM2, coverageFactor, expandedUncertaintyM2, effectiveDegreesOfFreedom } =
    figureOf(figure);
  const nu = effectiveDegreesOfFreedom ?? 'infinite';
  return stepOf(METHODS.budget, {
    values: inValues`u = ${standardUncertaintyM2} m², ν_eff = ${nu}, t = ${coverageFactor}`,
    value: expandedUncertaintyM2,
    unit: 'm²',
  });
}

/** The derivation of a reduction that is at hand. @throws {Refused} the code why there is no wind average */
export function traceOfReduction(
  reduction: Reduction,
  context: ReductionContext,
  basis: Basis,
  names: KeyNames,
): Derivation {
  const { steps: toZeroYaw, dragAreaM2 } = zeroYawSteps(reduction, context);
  const steps = [...toZeroYaw, ...(basis === 'wind-averaged' ? windSteps(reduction, dragAreaM2) : [])];
  const keyed = (basis === 'wind-averaged' ? reduction.windAverage.figure : null) ?? reduction.zeroYaw;
  const figure = figureOf(keyed);
  const { id, name } = reduction.parts.result;
  return {
    title: `Drag area C_D·A of ${name ?? id}, ${basis === 'wind-averaged' ? 'wind-averaged' : 'zero yaw'}`,
    value: basis === 'wind-averaged' ? (steps.at(-1)?.value ?? NaN) : dragAreaM2,
    unit: 'm²',
    standardUncertainty: figure.standardUncertaintyM2,
    expandedUncertainty: figure.expandedUncertaintyM2,
    coverageFactor: figure.coverageFactor,
    steps: [...steps, uncertaintyStep(keyed)],
    budget: budgetShares(figure.contributions, names),
  };
}

/**
 * How one result's drag area came about, from the raw value to the reference figure, by the same functions that the ranking
 * uses.
 *
 * @throws {Refused} unknown-result, the codes of `reduceResults` and of the result itself
 */
export function traceOfFigure(input: RankingInput, resultId: string, basis: Basis): Derivation {
  const context = reductionContextOf(input);
  const result =
    input.results.find(({ id }) => id === resultId) ??
    refuse('unknown-result', resultId, `There is no result “${resultId}”.`);
  return traceOfReduction(reduceResult(result, context), context, basis, namesIn(input));
}

/** A figure's derivation carried on to the coefficient on the common area [m²]. */
export function onCommonArea(derivation: Derivation, commonAreaM2: number): Derivation {
  const { value, standardUncertainty, expandedUncertainty, steps, budget } = derivation;
  return {
    ...derivation,
    title: `${derivation.title}, as a coefficient on ${plain(commonAreaM2)} m²`,
    value: value / commonAreaM2,
    unit: '',
    standardUncertainty: standardUncertainty / commonAreaM2,
    expandedUncertainty: expandedUncertainty / commonAreaM2,
    steps: [
      ...steps,
      stepOf(METHODS.commonArea, {
        values: inValues`${value} m² / ${commonAreaM2} m²`,
        value: value / commonAreaM2,
        unit: '',
      }),
    ],
    budget: budget.map((share) => ({ ...share, amount: share.amount / commonAreaM2 })),
  };
}
