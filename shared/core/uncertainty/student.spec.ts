import * as fc from 'fast-check';
import { Refused } from '../refusal';
import { studentCdf, studentQuantile } from './student';

const relative = (found: number, expected: number): number => Math.abs(found / expected - 1);

describe("Student's quantile", () => {
  it.each([
    [0.97725, 1, 13.967811487502548],
    [0.97725, 2.5, 3.7319974810595644],
    [0.97725, 16.76, 2.1607016290992567],
    [0.95, 4.348, 2.0837545290108226],
    [0.6, 0.5, 0.3979754267847906],
    [0.995, 16, 2.9207816224250998],
    [1e-6, 7.3, -13.493523060744643],
    [0.025, 120.5, -1.9798467346393647],
    [0.9999, 3, 22.203742273205002],
    [0.97725, 1e6, 2.0000049439106085],
  ])('at %d for ν = %d is %d (mpmath 1.3.0, 40 digits; SciPy 1.17.1 agrees)', (p, nu, t) => {
    expect(relative(studentQuantile(p, nu), t)).toBeLessThan(1e-13);
  });

  it('for infinite ν is the normal one: 2.0000024438996 at 0.97725 (mpmath 1.3.0)', () => {
    expect(relative(studentQuantile(0.97725), 2.000002443899603)).toBeLessThan(1e-14);
    expect(relative(studentQuantile(0.97725, 2156126796600), 2.0000024439)).toBeLessThan(1e-11);
  });

  it('for one degree of freedom is the Cauchy one, tan(π·(p − ½))', () => {
    fc.assert(
      fc.property(fc.double({ min: 0.001, max: 0.999, noNaN: true }), (p) => {
        const t = Math.tan(Math.PI * (p - 0.5));
        return Math.abs(studentQuantile(p, 1) - t) <= 1e-12 * Math.max(Math.abs(t), 1e-3);
      }),
    );
  });

  it('for two degrees of freedom is (2p − 1)/√(2p(1 − p))', () => {
    fc.assert(
      fc.property(fc.double({ min: 1e-6, max: 0.999, noNaN: true }), (p) => {
        const t = (2 * p - 1) / Math.sqrt(2 * p * (1 - p));
        return Math.abs(studentQuantile(p, 2) - t) <= 1e-12 * Math.max(Math.abs(t), 1e-3);
      }),
    );
  });

  it('undoes the distribution function', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 1e-8, max: 0.5, noNaN: true }),
        fc.double({ min: 0.2, max: 1e7, noNaN: true }),
        (p, nu) => relative(studentCdf(studentQuantile(p, nu), nu), p) < 1e-12,
      ),
    );
  });

  it('falls as ν grows, for a probability above one half', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0.3, max: 1e5, noNaN: true }),
        fc.double({ min: 1.01, max: 10, noNaN: true }),
        (nu, factor) => studentQuantile(0.97725, nu) > studentQuantile(0.97725, nu * factor),
      ),
    );
  });

  it('is 0 at one half and refuses what is no probability', () => {
    expect(studentQuantile(0.5, 3)).toBe(0);
    for (const p of [0, 1, -0.1, NaN]) expect(() => studentQuantile(p, 3)).toThrow(Refused);
    expect(() => studentQuantile(0.9, 0)).toThrow(Refused);
  });
});

describe("Student's distribution function", () => {
  it.each([
    [2, 3, 0.9303370157205785],
    [-1.2, 4.348, 0.14570583615029095],
    [0.4, 16.76, 0.6528957425842405],
    [5, 1.5, 0.9673121161894219],
    [1.3, 1e7, 0.9031995004324909],
  ])('at %d for ν = %d is %d (SciPy 1.17.1)', (t, nu, p) => {
    expect(relative(studentCdf(t, nu), p)).toBeLessThan(1e-13);
  });

  it('is symmetrical, and has its ends', () => {
    expect(studentCdf(0, 4)).toBe(0.5);
    expect(studentCdf(Infinity, 4)).toBe(1);
    expect(studentCdf(-Infinity, 4)).toBe(0);
    expect(studentCdf(1.7, 9) + studentCdf(-1.7, 9)).toBeCloseTo(1, 14);
  });
});
