import type { Check } from '#shared/core/checks/check';
import { THIN_SPACE } from '../../core/numbers/format-number';
import type { NumberLocale } from '../../core/numbers/number-locale';
import type { QuantityFormat } from '../quantity/quantity-format';

/** What sentences are written with: the person's units and number locale. */
export interface CheckLanguage {
  readonly format: QuantityFormat;
  readonly locale: NumberLocale;
}

/** `4.29 × 10⁶`, as it is read aloud in the trade; `–` where no air or speed is stated. */
export function reynoldsWords(reynolds: number | null, format: QuantityFormat): string {
  if (reynolds === null) return '–';
  return `${format.value(reynolds / 1e6, 'number', { digits: 2 })} × 10⁶`;
}

/** `0.12`; `–` where no air or speed is stated. */
export const machWords = (mach: number | null, format: QuantityFormat): string =>
  mach === null ? '–' : format.value(mach, 'number', { digits: 2 });

export const percent = (fraction: number, format: QuantityFormat, digits = 1): string =>
  format.text(fraction * 100, 'percent', { digits });

/** A static pressure as it is read off in a hall. */
export const hectopascals = (pascals: number, format: QuantityFormat): string =>
  `${format.value(pascals / 100, 'number', { digits: 0 })}${THIN_SPACE}hPa`;

/** Value and bounds of a check in one way of writing; `–` stands for what there is not. */
export interface CheckFigures {
  readonly value: string;
  readonly from: string;
  readonly to: string;
  readonly excludedAbove: string;
}

export function figuresOf(
  { value, limit }: Pick<Check, 'value' | 'limit'>,
  write: (figure: number) => string,
): CheckFigures {
  const written = (figure: number | null | undefined): string => (figure == null ? '–' : write(figure));
  return {
    value: written(value),
    from: written(limit?.from),
    to: written(limit?.to),
    excludedAbove: written(limit?.excludedAbove),
  };
}

/** The value is under the lower bound; else, outside a range, it is over the upper one. */
export const isBelow = ({ value, limit }: Pick<Check, 'value' | 'limit'>): boolean =>
  value !== null && limit?.from != null && value < limit.from;
