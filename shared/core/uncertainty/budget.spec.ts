import * as fc from 'fast-check';
import {
  amount,
  budgetOf,
  differenceOf,
  effectiveDegreesOfFreedom,
  figureOf,
  probabilityAbove,
  probabilityLower,
  standardUncertainty,
  type KeyedFigure,
} from './budget';
import { studentQuantile } from './student';

const within = (found: number, expected: number, allowed: number): void =>
  expect(Math.abs(found - expected)).toBeLessThanOrEqual(allowed);

describe('JCGM 100:2008, example H.1 (end gauge; amounts in nm as printed)', () => {
  const budget = budgetOf([
    amount('standard', 25, 18),
    amount('difference', 9.7, 25.6),
    amount('expansion', 2.9, 50),
    amount('temperature', 16.6, 2),
  ]);

  it('has u = 32 nm and ν = 16, not truncated 16.76', () => {
    within(standardUncertainty(budget), 32, 0.6);
    within(effectiveDegreesOfFreedom(budget), 16.76, 0.01);
    expect(Math.trunc(effectiveDegreesOfFreedom(budget))).toBe(16);
  });

  it('has k = 2.92 and U = 93 nm at 99 %', () => {
    within(studentQuantile(0.995, 16), 2.92, 0.005);
    within(studentQuantile(0.995, 16) * standardUncertainty(budget), 93, 0.6);
  });
});

it('gives the t and ν of the AUTO83B comparison (NIST/SEMATECH handbook 1.3.5.3; inputs from memory, recomputed)', () => {
  const mean = (value: number, sd: number, n: number, key: string): KeyedFigure => ({
    dragAreaM2: value,
    budget: budgetOf([amount(key, sd / Math.sqrt(n), n - 1)]),
  });
  const difference = differenceOf(mean(20.14458, 6.4147, 249, 'us'), mean(30.48101, 6.10771, 79, 'japan'));
  within(difference.dragAreaM2 / standardUncertainty(difference.budget), -12.94627, 2e-4);
  within(effectiveDegreesOfFreedom(difference.budget), 136.875, 1e-3);
});

describe('A budget', () => {
  it('adds amounts of one key with their signs, keeps the smallest ν and the first variance estimate', () => {
    expect(
      budgetOf([amount('k', 0.003, 9, 'e'), amount('k', -0.001, 4, 'other'), amount('a', 1e-16, 1)]),
    ).toEqual([{ key: 'k', amountM2: 0.002, degreesOfFreedom: 4, varianceEstimate: 'e' }]);
  });

  it('without any amount is exactly known', () => {
    const figure = figureOf({ dragAreaM2: 0.6, budget: [] });
    expect(figure).toMatchObject({
      standardUncertaintyM2: 0,
      effectiveDegreesOfFreedom: null,
      expandedUncertaintyM2: 0,
      contributions: [],
    });
  });

  it('pools contributions of one variance estimate: squares first, the smallest ν', () => {
    const budget = budgetOf([amount('level', 0.003, 3, 'sweep'), amount('slope', 0.004, 3, 'sweep')]);
    expect(effectiveDegreesOfFreedom(budget)).toBeCloseTo(3, 12);
    const apart = budgetOf([amount('level', 0.003, 3), amount('slope', 0.004, 3)]);
    expect(effectiveDegreesOfFreedom(apart)).toBeGreaterThan(3);
  });

  it('sorts by code units, not by any language', () => {
    expect(budgetOf([amount('é', 1), amount('b', 1), amount('Z', 1)]).map((entry) => entry.key)).toEqual([
      'Z',
      'b',
      'é',
    ]);
  });
});

describe('A difference', () => {
  const own = fc.double({ min: 1e-4, max: 0.01, noNaN: true });
  const shared = fc.double({ min: -0.02, max: 0.02, noNaN: true });

  it('loses what both hold under one key', () => {
    fc.assert(
      fc.property(own, own, shared, (a, b, both) => {
        const x = { dragAreaM2: 0.6, budget: budgetOf([amount('bias', both), amount('a', a)]) };
        const y = { dragAreaM2: 0.62, budget: budgetOf([amount('bias', both), amount('b', b)]) };
        const { budget } = differenceOf(x, y);
        expect(budget.map((entry) => entry.key)).toEqual(['a', 'b']);
        expect(standardUncertainty(budget)).toBeCloseTo(Math.hypot(a, b), 14);
      }),
    );
  });

  it('is decided by Student: P(x < y) + P(y < x) = 1, and certain without uncertainty', () => {
    const x = { dragAreaM2: 0.6, budget: budgetOf([amount('a', 0.01, 2)]) };
    const y = { dragAreaM2: 0.61, budget: budgetOf([amount('b', 0.01, 2)]) };
    expect(probabilityLower(x, y) + probabilityLower(y, x)).toBeCloseTo(1, 14);
    expect([0.1, 0, -0.1].map((d) => probabilityAbove(d, 0, Infinity))).toEqual([1, 0.5, 0]);
  });
});
