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
