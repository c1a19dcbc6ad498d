import type { DerivationStep as TracedStep, Derivation as Trace } from '#shared/core/derivation/derivation';
import type { QuantityFormat } from '../quantity/quantity-format';
import type { Derivation, DerivationStep } from './derivation';
import { plainFigure, wordedResult, wordedUncertainty, wordedValues } from './worded';

/** A traced step as the sheet shows it, in the person's marks. */
export function stepFromTrace(step: TracedStep, format: QuantityFormat): DerivationStep {
  const { title, formulaMathml, formulaText, source, assumed, cautions } = step;
  return {
    title,
    result: wordedResult(step, format),
    formulaMathml,
    formulaText,
    values: wordedValues(step.values, format),
    source,
    method: `${step.methodId}@${step.version}`,
    assumed,
    cautions,
  };
}

/** The method's trace of a drag area as the sheet shows it, in the person's marks. */
export function derivationFromTrace(trace: Trace, summary: string, format: QuantityFormat): Derivation {
  return {
    figure: {
      value: format.value(trace.value, 'drag-area'),
      expandedU: format.value(trace.expandedUncertainty, 'drag-area'),
      unit: trace.unit,
      plain: plainFigure(trace.value, trace.expandedUncertainty, trace.unit),
    },
    summary,
    steps: trace.steps.map((step) => stepFromTrace(step, format)),
    budget: trace.budget.map(({ label, shareOfVariance, amount, degreesOfFreedom }) => ({
      label,
      share: shareOfVariance,
      u: wordedUncertainty(amount, trace.unit, format),
      freedom: freedomWords(degreesOfFreedom, format),
    })),
  };
}

/** Degrees of freedom as they stand in a budget. */
export function freedomWords(degreesOfFreedom: number | null, format: QuantityFormat): string {
  return degreesOfFreedom === null ? '∞' : format.value(degreesOfFreedom, 'number', { digits: 0 });
}
