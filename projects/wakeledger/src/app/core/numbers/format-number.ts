import { marksOf, type NumberLocale } from './number-locale';

export const MINUS = '\u2212';
/** Between a figure and its unit; does not break. */
export const THIN_SPACE = '\u202f';

/**
 * A number as a person reads it: fixed digits after the mark, a real minus, digits in threes from 10 000 on. A zero
 * has no sign, whatever it was rounded from.
 */
export function formatNumber(value: number, digits: number, locale: NumberLocale): string {
  const marks = marksOf(locale);
  const [whole = '0', rest] = Math.abs(value).toFixed(digits).split('.');
  const grouped = whole.length > 4 ? whole.replace(/\B(?=(\d{3})+(?!\d))/g, marks.group) : whole;
  const text = rest === undefined ? grouped : `${grouped}${marks.decimal}${rest}`;
  return value < 0 && /[1-9]/.test(text) ? `${MINUS}${text}` : text;
}

/** A change: its sign is always written, a zero has none. */
export function formatSigned(value: number, digits: number, locale: NumberLocale): string {
  const text = formatNumber(value, digits, locale);
  return value > 0 && /[1-9]/.test(text) ? `+${text}` : text;
}

/** What an input shows for a stored value: every digit that it has, ungrouped, so that nothing is lost by looking. */
export function formatForInput(value: number, locale: NumberLocale): string {
  return String(value).replace('.', marksOf(locale).decimal).replace('-', MINUS);
}

const RAISED: Readonly<Record<string, string>> = {
  '-': '⁻',
  ...Object.fromEntries([...'⁰¹²³⁴⁵⁶⁷⁸⁹'].map((digit, index) => [String(index), digit])),
};

/** Beyond these powers of ten a number is read by its exponent rather than by counting noughts. */
const LEAST_EXPONENT = -4;
const MOST_EXPONENT = 5;
/** Digits in front of a power of ten. */
const MANTISSA_DIGITS = 4;

/**
 * A number inside a calculation as a person reads it: so many significant digits at most, `1.577 × 10⁻⁵` where noughts
 * would have to be counted, thin spaces between thousands (a comma would look like the next value), a real minus. Whole
 * numbers below a million, mostly typed ones, stay whole.
 */
export function formatSignificant(value: number, significant: number, locale: NumberLocale): string {
  const { decimal } = marksOf(locale);
  const sign = value < 0 ? MINUS : '';
  const size = Math.abs(value);
  const exponent = size === 0 ? 0 : Math.floor(Math.log10(Number(size.toPrecision(significant))));
  if (exponent < LEAST_EXPONENT || exponent > MOST_EXPONENT) {
    const [mantissa = '', power = ''] = size
      .toExponential(Math.min(significant, MANTISSA_DIGITS) - 1)
      .replace('e+', 'e')
      .split('e');
    const raised = [...power].map((digit) => RAISED[digit] ?? '').join('');
    return `${sign}${mantissa.replace('.', decimal)}\u00a0×\u00a010${raised}`;
  }
  const kept = Number.isInteger(size) ? size : Number(size.toPrecision(significant));
  const [whole = '0', rest] = String(kept).split('.');
  const grouped = whole.length > 4 ? whole.replace(/\B(?=(\d{3})+(?!\d))/g, THIN_SPACE) : whole;
  return `${sign}${grouped}${rest === undefined ? '' : decimal + rest}`;
}
