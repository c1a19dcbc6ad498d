import { studentQuantile } from './student';

/**
 * Table G.2 of JCGM 100:2008: t_p(ν) such that −t_p to t_p holds the fraction p of Student's distribution, as printed (memory; two or three
 * decimals; the quantiles of SciPy 1.17.1 round to them).
 */
const DEGREES = [1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 12, 14, 16, 18, 20, 25, 30, 40, 50, 100, Infinity] as const;
const PRINTED = [
  {
    fraction: 0.95,
    t: '12.71 4.30 3.18 2.78 2.57 2.45 2.36 2.31 2.26 2.23 2.18 2.14 2.12 2.10 2.09 2.06 2.04 2.02 2.01 1.984 1.960',
  },
  {
    fraction: 0.9545,
    t: '13.97 4.53 3.31 2.87 2.65 2.52 2.43 2.37 2.32 2.28 2.23 2.20 2.17 2.15 2.13 2.11 2.09 2.06 2.05 2.025 2.000',
  },
  {
    fraction: 0.99,
    t: '63.66 9.92 5.84 4.60 4.03 3.71 3.50 3.36 3.25 3.17 3.05 2.98 2.92 2.88 2.85 2.79 2.75 2.70 2.68 2.626 2.576',
  },
  {
    fraction: 0.9973,
    t: '235.8 19.21 9.22 6.62 5.51 4.90 4.53 4.28 4.09 3.96 3.76 3.64 3.54 3.48 3.42 3.33 3.27 3.20 3.16 3.077 3.000',
  },
] as const;

describe('The printed table of the guide to uncertainty', () => {
  const rows = PRINTED.flatMap(({ fraction, t }) =>
    t.split(' ').map((printed, i) => [fraction, DEGREES[i] ?? NaN, printed] as const),
  );

  it.each(rows)(
    'gives for the fraction %d and ν = %d the t that the product uses: %s',
    (fraction, nu, printed) => {
      const decimals = printed.split('.')[1]?.length ?? 0;
      expect(studentQuantile((1 + fraction) / 2, nu).toFixed(decimals)).toBe(printed);
    },
  );
});
