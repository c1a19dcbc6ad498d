import type { DerivationStep as TracedStep } from '#shared/core/derivation/derivation';
import { type InValues, plain, valuesAsText } from '#shared/core/derivation/in-values';
import { THIN_SPACE } from '../../core/numbers/format-number';
import type { QuantityFormat } from '../quantity/quantity-format';
import type { Worded } from './derivation';

/** Significant digits of a number in a formula. */
const VALUE_DIGITS = 5;
/** Significant digits of a result whose unit has no usual number of decimals. */
const RESULT_DIGITS = 4;
/** Decimals of results: one more than a figure of the product has, for what stands between reading and figure. */
const DECIMALS: Readonly<Record<string, number>> = { 'm²': 4, Pa: 1, N: 1, 'kg/m³': 4 };
const JOULES_PER_MEGAJOULE = 1e6;

const withUnit = (words: string, unit: string): string =>
  unit === '' ? words : `${words}${THIN_SPACE}${unit}`;

/** A formula in values: numbers of five digits that count, a thin space before each unit. */
export function wordedValues(values: InValues, format: QuantityFormat): Worded {
  const shown = values.map((part, index) => {
    if (typeof part === 'number') return format.significant(part, VALUE_DIGITS);
    return typeof values[index - 1] === 'number' ? part.replace(/^ (?=[\p{L}°%])/u, THIN_SPACE) : part;
  });
  // A symbol stays on one line with what it equals.
  return { shown: shown.join('').replaceAll(' = ', '\u00a0=\u00a0'), plain: valuesAsText(values) };
}

function resultWords({ methodId, value, unit }: TracedStep, format: QuantityFormat): string {
  if (unit.startsWith('J')) {
    return withUnit(format.significant(value / JOULES_PER_MEGAJOULE, RESULT_DIGITS), `M${unit}`);
  }
  const decimals = DECIMALS[unit];
  if (decimals !== undefined) return withUnit(format.value(value, 'number', { digits: decimals }), unit);
  // Nobody knows a Reynolds number to its fourth digit: the length is a convention.
  const digits = methodId === 'flow-similarity' ? 3 : RESULT_DIGITS;
  return withUnit(format.significant(value, digits), unit);
}

/** What a step comes to. */
export function wordedResult(step: TracedStep, format: QuantityFormat): Worded {
  return { shown: resultWords(step, format), plain: `${plain(step.value)} ${step.unit}`.trim() };
}

function uncertaintyDecimals(size: number): number {
  if (size === 0) return 0;
  return Math.min(6, Math.max(0, 1 - Math.floor(Math.log10(size))));
}

/** A standard uncertainty: two digits that count say all that is known of it. */
export function wordedUncertainty(amount: number, unit: string, format: QuantityFormat): Worded {
  const size = Math.abs(amount);
  return {
    shown: withUnit(format.value(size, 'number', { digits: uncertaintyDecimals(size) }), unit),
    plain: `${plain(size)} ${unit}`.trim(),
  };
}

/** `0.5941234 ± 0.0078901 m²` for what is copied. */
export function plainFigure(value: number, expandedU: number, unit: string): string {
  return `${plain(value)} ± ${plain(expandedU)} ${unit}`.trim();
}
