import type { CorrelationPairInput } from '../ranking/ranking-input';
import { refuse } from '../refusal';
import { amount, budgetOf, figureOf, keyedFigureOf, scaled } from '../uncertainty/budget';
import type { Figure, FigureInput } from '../uncertainty/figure';
import { correlatedDragArea, correlationAmounts, fitCorrelation, type CorrelationFit } from './correlation';

/** Input of the operation `correlation`. */
export interface CorrelationOperationInput {
  readonly pairs: readonly CorrelationPairInput[];
  /** To be carried through; needs `correlationId` and `variantId`. */
  readonly figure?: FigureInput | null | undefined;
  readonly correlationId?: string | null | undefined;
  readonly variantId?: string | null | undefined;
  /** Keys of the source's own bias. */
  readonly dropKeys?: readonly string[] | null | undefined;
  readonly referenceFacilityBias?:
    | {
        readonly key: string;
        readonly uRelative?: number | null | undefined;
        readonly uM2?: number | null | undefined;
      }
    | null
    | undefined;
}

export interface CorrelationOutput {
  readonly slope: number;
  readonly interceptM2: number;
  readonly centroidM2: number;
  readonly referenceCentroidM2: number;
  readonly levelUncertaintyM2: number;
  readonly slopeUncertainty: number;
  readonly betweenPairsStandardDeviationM2: number;
  readonly chiSquared: number;
  readonly wideningFactor: number;
  readonly offsetOnly: boolean;
  /** Null: infinite. */
  readonly degreesOfFreedom: number | null;
  readonly validFromM2: number;
  readonly validToM2: number;
  readonly correlatedFigure?: Figure;
}

function carriedThrough(fit: CorrelationFit, input: CorrelationOperationInput, given: FigureInput): Figure {
  const correlationId =
    input.correlationId ?? refuse('missing-input', 'correlationId', 'correlationId is missing.');
  const variantId = input.variantId ?? refuse('missing-input', 'variantId', 'variantId is missing.');
  const figure = keyedFigureOf(given);
  const dropped = new Set(input.dropKeys ?? []);
  const bias = input.referenceFacilityBias;
  const dragAreaM2 = correlatedDragArea(fit, figure.dragAreaM2, correlationId);
  const kept = figure.budget.filter(({ key }) => !dropped.has(key));
  return figureOf({
    dragAreaM2,
    budget: budgetOf([
      ...scaled(kept, fit.slope),
      ...correlationAmounts(fit, figure.dragAreaM2, correlationId, variantId),
      ...(bias == null ? [] : [amount(bias.key, (bias.uRelative ?? 0) * dragAreaM2 + (bias.uM2 ?? 0))]),
    ]),
  });
}

/**
 * The operation `correlation`: the fit, and a figure carried to the reference facility with it.
 *
 * @throws {Refused} correlation-too-few-pairs, uncertainty-zero, correlation-no-spread, correlation-negative-slope,
 *   correlation-range, missing-input
 */
export function evaluateCorrelation(input: CorrelationOperationInput): CorrelationOutput {
  const fit = fitCorrelation(input.pairs);
  const { degreesOfFreedom } = fit;
  return {
    slope: fit.slope,
    interceptM2: fit.interceptM2,
    centroidM2: fit.centroidM2,
    referenceCentroidM2: fit.referenceCentroidM2,
    levelUncertaintyM2: fit.levelUncertaintyM2,
    slopeUncertainty: fit.slopeUncertainty,
    betweenPairsStandardDeviationM2: fit.betweenPairsStandardDeviationM2,
    chiSquared: fit.chiSquared,
    wideningFactor: fit.wideningFactor,
    offsetOnly: fit.offsetOnly,
    degreesOfFreedom: degreesOfFreedom === Infinity ? null : degreesOfFreedom,
    validFromM2: fit.validFromM2,
    validToM2: fit.validToM2,
    ...(input.figure != null && { correlatedFigure: carriedThrough(fit, input, input.figure) }),
  };
}
