import type { DECIMALS } from '#shared/contracts/imports';

export type Decimal = (typeof DECIMALS)[number];

export type Reading<T> = { readonly value: T } | { readonly problem: string };

const MINUS_SIGNS = /^[−–‒﹣－]/;
const SPACES = /[\s\u00a0\u2007\u2009\u202f]/;
const GROUPED_BY_SPACE = /^[+-]?\d{1,3}(?:[\s\u00a0\u2007\u2009\u202f'’]\d{3})+(?=$|[.,])/;

/** A real minus becomes a typed one; spaces between groups of three digits go. */
function plain(text: string): string {
  const signed = text.trim().replace(MINUS_SIGNS, '-');
  const grouped = GROUPED_BY_SPACE.exec(signed);
  if (grouped === null) return signed;
  return grouped[0].replace(/[^\d+-]/g, '') + signed.slice(grouped[0].length);
}

const PLAIN = {
  point: /^[+-]?(?:\d+\.?\d*|\.\d+)(?:e[+-]?\d+)?$/i,
  comma: /^[+-]?(?:\d+,?\d*|,\d+)(?:e[+-]?\d+)?$/i,
} as const;
/** Groups of three that cannot be anything else: with a decimal sign after them, or more than one group. */
const GROUPED = {
  point: /^[+-]?\d{1,3}(?:(?:,\d{3})+\.\d+|(?:,\d{3}){2,})$/,
  comma: /^[+-]?\d{1,3}(?:(?:\.\d{3})+,\d+|(?:\.\d{3}){2,})$/,
} as const;
const ONE_GROUP = { point: /^[+-]?[1-9]\d{0,2},\d{3}$/, comma: /^[+-]?[1-9]\d{0,2}\.\d{3}$/ } as const;
const OTHER: Readonly<Record<Decimal, Decimal>> = { point: 'comma', comma: 'point' };
const SIGN: Readonly<Record<Decimal, string>> = { point: '.', comma: ',' };

/**
 * Reads a number written with the file's decimal sign. What could be read in two ways is refused, never guessed; unless a
 * person was asked about this very file (`asked`): then a single group is the thousand that they said it is.
 *
 * @returns the value, or what is wrong with it and what would be accepted
 */
export function readNumber(text: string, decimal: Decimal, asked = false): Reading<number> {
  const written = plain(text);
  const group = SIGN[OTHER[decimal]];
  if (PLAIN[decimal].test(written)) return finite(Number(written.replace(',', '.')), text);
  if (GROUPED[decimal].test(written) || (asked && ONE_GROUP[decimal].test(written)))
    return finite(Number(written.replaceAll(group, '').replace(',', '.')), text);
  if (ONE_GROUP[decimal].test(written)) {
    const thousands = written.replace(group, '');
    const fraction = written.replace(group, SIGN[decimal]);
    return { problem: `“${text}” can be read in two ways. Write ${thousands} or ${fraction}.` };
  }
  if (PLAIN[OTHER[decimal]].test(written)) {
    return {
      problem: `“${text}” has a decimal ${OTHER[decimal]}, and the decimal sign of this file is the ${decimal}. Write ${written.replace(group, SIGN[decimal])}.`,
    };
  }
  return {
    problem: `“${text}” is not a number. Write digits with a decimal ${decimal}, for example ${example(decimal)}.`,
  };
}

const example = (decimal: Decimal): string => `0${SIGN[decimal]}285`;

function finite(value: number, text: string): Reading<number> {
  return Number.isFinite(value) ? { value } : { problem: `“${text}” is too large for a number.` };
}

export type DecimalEvidence = Decimal | 'either' | 'none';

/**
 * What one cell says about the decimal sign; undefined when it is no number. `1.234` says nothing: it can be a
 * thousand or a fraction.
 */
export function decimalEvidence(text: string): DecimalEvidence | undefined {
  const written = plain(text);
  if (SPACES.test(written)) return undefined;
  if (/^[+-]?\d+(?:e[+-]?\d+)?$/i.test(written)) return 'none';
  if (GROUPED.point.test(written)) return 'point';
  if (GROUPED.comma.test(written)) return 'comma';
  if (ONE_GROUP.point.test(written) || ONE_GROUP.comma.test(written)) return 'either';
  if (PLAIN.point.test(written)) return 'point';
  if (PLAIN.comma.test(written)) return 'comma';
  return undefined;
}
