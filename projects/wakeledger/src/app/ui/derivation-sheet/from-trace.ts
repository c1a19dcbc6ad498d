import type { Derivation as Trace } from '#shared/core/derivation/derivation';
import type { QuantityFormat } from '../quantity/quantity-format';
import type { Derivation } from './derivation';

/** Significant digits of what stands between the raw value and the figure. */
const STEP_DIGITS = 5;

/** Decimals that leave a value with so many significant digits, six at most. */
export function decimalsOf(value: number, significant = STEP_DIGITS): number {
  if (value === 0 || !Number.isFinite(value)) return 0;
  return Math.min(6, Math.max(0, significant - 1 - Math.floor(Math.log10(Math.abs(value)))));
}

/** The method's trace of a drag area as the sheet shows it, in the person's marks. */
export function derivationFromTrace(trace: Trace, summary: string, format: QuantityFormat): Derivation {
  const figure = (value: number, unit: string): string => {
    const text = format.value(value, 'number', { digits: decimalsOf(value) });
    return unit === '' ? text : `${text}\u202f${unit}`;
  };
  return {
    figure: {
      value: format.value(trace.value, 'drag-area'),
      expandedU: format.value(trace.expandedUncertainty, 'drag-area'),
      unit: trace.unit,
    },
    summary,
    steps: trace.steps.map((step) => ({
      title: step.title,
      result: figure(step.value, step.unit),
      formulaMathml: step.formulaMathml,
      formulaText: step.formulaText,
      values: step.values,
      source: step.source,
      method: `${step.methodId}@${step.version}`,
      assumed: step.assumed,
      cautions: step.cautions,
    })),
    budget: trace.budget.map(({ label, shareOfVariance, amount }) => ({
      label,
      share: shareOfVariance,
      u: figure(Math.abs(amount), trace.unit),
    })),
  };
}
