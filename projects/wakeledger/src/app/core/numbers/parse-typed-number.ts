/** The two ways in which a typed number can be meant. */
export interface Readings {
  /** The mark taken as the decimal mark. */
  readonly decimal: number;
  /** The mark taken as separating thousands. */
  readonly grouped: number;
}

export type TypedNumber =
  | { readonly kind: 'empty' }
  | { readonly kind: 'number'; readonly value: number }
  | { readonly kind: 'ambiguous'; readonly readings: Readings }
  | { readonly kind: 'not-a-number' };

export interface Accepted {
  readonly minimum?: number;
  readonly maximum?: number;
}

const SPACES = /[\s\u00a0\u2009\u202f'’]/g;
const MINUSES = /[\u2212\u2013\u2012\ufe63\uff0d]/g;
const SHAPE = /^[-+]?(\d[\d.,]*|[.,]\d+)([eE][-+]?\d{1,3})?$/;
const GROUPS = /^\d{1,3}([.,]\d{3})+$/;

/**
 * Reads a number as a person types it: comma or point, a real or typed minus, spaces between thousands. `1.234` can
 * mean 1.234 or 1234: both readings come back, unless the accepted range leaves only one. It is never guessed.
 */
export function parseTypedNumber(text: string, accepted: Accepted = {}): TypedNumber {
  const compact = text.trim().replace(SPACES, '').replace(MINUSES, '-');
  if (compact === '') return { kind: 'empty' };
  if (!SHAPE.test(compact)) return { kind: 'not-a-number' };

  const [, sign = '', digits = '', exponent = ''] = /^([-+]?)([\d.,]+)(.*)$/.exec(compact) ?? [];
  const read = (unsigned: string): number => Number(`${sign}${unsigned}${exponent}`);
  const marks = digits.match(/[.,]/g) ?? [];
  if (marks.length === 0) return number(read(digits));

  const last = Math.max(digits.lastIndexOf('.'), digits.lastIndexOf(','));
  const whole = digits.slice(0, last);
  const fraction = digits.slice(last + 1);
  const kinds = new Set(marks);

  if (kinds.size === 2) {
    // Two kinds of mark: the last is the decimal mark, the other must set off thousands.
    const decimalOnce = marks.filter((mark) => mark === digits[last]).length === 1;
    if (!decimalOnce || !GROUPS.test(whole)) return { kind: 'not-a-number' };
    return number(read(`${whole.replace(/[.,]/g, '')}.${fraction || '0'}`));
  }
  if (marks.length > 1) {
    return GROUPS.test(digits) ? number(read(digits.replace(/[.,]/g, ''))) : { kind: 'not-a-number' };
  }
  const decimal = read(`${whole || '0'}.${fraction || '0'}`);
  // Thousands never begin with a nought, and nobody groups beside an exponent.
  if (!GROUPS.test(digits) || digits.startsWith('0') || exponent) return number(decimal);
  return settle({ decimal, grouped: read(whole + fraction) }, accepted);
}

function number(value: number): TypedNumber {
  return Number.isFinite(value) ? { kind: 'number', value } : { kind: 'not-a-number' };
}

function settle(readings: Readings, accepted: Accepted): TypedNumber {
  const decimalFits = within(readings.decimal, accepted);
  const groupedFits = within(readings.grouped, accepted);
  if (decimalFits && !groupedFits) return number(readings.decimal);
  if (groupedFits && !decimalFits) return number(readings.grouped);
  return { kind: 'ambiguous', readings };
}

export function within(value: number, { minimum = -Infinity, maximum = Infinity }: Accepted): boolean {
  return value >= minimum && value <= maximum;
}
