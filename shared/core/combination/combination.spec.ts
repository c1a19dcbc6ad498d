import fc from 'fast-check';
import { Refused } from '../refusal';
import { amount, budgetOf, figureOf, standardUncertainty, type KeyedFigure } from '../uncertainty/budget';
import { combine } from './combination';
import { randomEffects } from './random-effects';

const figure = (dragAreaM2: number, amounts: Readonly<Record<string, number>>): KeyedFigure => ({
  dragAreaM2,
  budget: budgetOf(Object.entries(amounts).map(([key, amountM2]) => amount(key, amountM2))),
});

const alone = (values: readonly (readonly [number, number])[]): KeyedFigure[] =>
  values.map(([value, u], i) => figure(value, { [`repeatability:${i}`]: u }));

/**
 * BCG against tuberculosis: 13 trials, cases and others among the vaccinated and among the controls (Colditz et al., JAMA 271 (1994) 698;
 * the counts are those of the data set dat.bcg that the R package metafor carries, memory; the figures agree with the ones it prints).
 */
const BCG = [
  [4, 119, 11, 128],
  [6, 300, 29, 274],
  [3, 228, 11, 209],
  [62, 13536, 248, 12619],
  [33, 5036, 47, 5761],
  [180, 1361, 372, 1079],
  [8, 2537, 10, 619],
  [505, 87886, 499, 87892],
  [29, 7470, 45, 7232],
  [17, 1699, 65, 1600],
  [186, 50448, 141, 27197],
  [5, 2493, 3, 2338],
  [27, 16886, 29, 17825],
] as const;

/** Log risk ratio and its standard error: ln((a/n₁)/(c/n₂)), √(1/a − 1/n₁ + 1/c − 1/n₂). */
const logRiskRatios = BCG.map(([a, b, c, d]): readonly [number, number] => [
  Math.log(a / (a + b) / (c / (c + d))),
  Math.sqrt(1 / a - 1 / (a + b) + 1 / c - 1 / (c + d)),
]);

describe('The mean of DerSimonian and Laird', () => {
  // metafor's tests and manual print these to four decimals: fixed −0.4303, Q 152.2330, τ² 0.3088, random −0.7141 (0.1787).
  test('of the BCG trials is the published one, beside the fixed mean and its χ²', () => {
    const combined = combine(alone(logRiskRatios), 'bcg');
    expect(combined.figure.dragAreaM2).toBeCloseTo(-0.4303, 4);
    expect(combined.chiSquared).toBeCloseTo(152.233, 4);
    expect(combined.betweenResultsVarianceM4).toBeCloseTo(0.3088, 4);
    expect(combined.randomEffectsMeanM2).toBeCloseTo(-0.7141, 4);
    expect(combined.randomEffectsStandardErrorM2).toBeCloseTo(0.1787, 4);
  });

  test('is the weighted mean where the results agree', () => {
    const agreeing = randomEffects([1, 1.01], [0.1, 0.1]);
    expect(agreeing.betweenResultsVariance).toBe(0);
    expect(agreeing.mean).toBeCloseTo(1.005, 14);
  });

  test('of one result is that result', () => {
    expect(randomEffects([0.6], [0.01])).toEqual({
      betweenResultsVariance: 0,
      mean: 0.6,
      standardError: expect.closeTo(0.01, 14) as number,
    });
  });
});

describe('The Birge ratio', () => {
  /**
   * Mass of the charged kaon [MeV]: the five measurements that the Particle Data Group's scale factor counts (values memory: Denisov 91,
   * Gall 88, Barkov 79, Cheng 75, Backenstoss 73). Its average: 493.677 ± 0.013, scale factor S = √(χ²/(N − 1)) = 2.4 (Review of Particle
   * Physics 2022): S is Birge's ratio under another name.
   */
  const kaon = combine(
    alone([
      [493.696, 0.007],
      [493.636, 0.011],
      [493.67, 0.029],
      [493.657, 0.02],
      [493.691, 0.04],
    ]),
    'kaon',
  );

  test('of the charged kaon’s mass is the scale factor that the Particle Data Group prints', () => {
    expect(kaon.birgeRatio).toBeCloseTo(2.4, 1);
    expect(kaon.figure.dragAreaM2).toBeCloseTo(493.677, 3);
  });

  test('widens the mean to the printed uncertainty, with degrees of freedom of its own', () => {
    expect(standardUncertainty(kaon.figure.budget)).toBeCloseTo(0.013, 3);
    expect(standardUncertainty(kaon.figure.budget)).toBeCloseTo(
      kaon.birgeRatio! * kaon.internalStandardUncertaintyM2,
      14,
    );
    expect(kaon.figure.budget.find(({ key }) => key === 'combination:kaon')).toMatchObject({
      degreesOfFreedom: 4,
      varianceEstimate: 'combination:kaon',
    });
  });

  test('below 1 widens nothing', () => {
    const agreeing = combine(
      alone([
        [0.6, 0.01],
        [0.601, 0.01],
      ]),
      'v',
    );
    expect(agreeing.birgeRatio).toBeLessThan(1);
    expect(agreeing.figure.budget.map(({ key }) => key)).toEqual(['repeatability:0', 'repeatability:1']);
  });
});

describe('What several results hold in common', () => {
  const bias = (first: number, second: number) =>
    combine(
      [
        figure(0.64, { 'facility-bias:A': first, 'repeatability:a': 0.002 }),
        figure(0.65, { 'facility-bias:A': second, 'repeatability:b': 0.002 }),
      ],
      'v',
    );

  test('survives whole and takes no part in the weights', () => {
    const combined = bias(0.005, 0.005);
    expect(combined.sharedKeys).toEqual(['facility-bias:A']);
    expect(combined.unsharedStandardUncertaintyM2).toEqual([0.002, 0.002]);
    expect(combined.figure.budget.find(({ key }) => key === 'facility-bias:A')?.amountM2).toBeCloseTo(
      0.005,
      15,
    );
  });

  test('is the smaller amount of two, the excess being the larger one’s own', () => {
    const combined = bias(0.005, 0.003);
    expect(combined.sharedKeys).toEqual(['facility-bias:A']);
    expect(combined.unsharedStandardUncertaintyM2[0]).toBeCloseTo(Math.hypot(0.002, 0.002), 15);
    expect(combined.unsharedStandardUncertaintyM2[1]).toBe(0.002);
  });

  test('is nothing where the signs differ: each amount is its own, and they cancel in the mean', () => {
    const combined = bias(0.005, -0.005);
    expect(combined.sharedKeys).toEqual([]);
    expect(combined.figure.budget.some(({ key }) => key === 'facility-bias:A')).toBe(false);
  });

  test('of negative sign is the amount nearest to zero', () => {
    expect(bias(-0.005, -0.003).unsharedStandardUncertaintyM2[1]).toBe(0.002);
  });
});

describe('A weighted mean', () => {
  const refusalOf = (figures: readonly KeyedFigure[]): string | undefined => {
    try {
      combine(figures, 'v');
    } catch (error) {
      if (error instanceof Refused) return error.code;
      throw error;
    }
    return undefined;
  };

  test('of nothing is refused', () => {
    expect(refusalOf([])).toBe('nothing-to-combine');
  });

  test('is refused where a result has no uncertainty of its own', () => {
    const shared = { 'facility-bias:A': 0.005 };
    expect(refusalOf([figure(0.64, shared), figure(0.65, { ...shared, 'repeatability:b': 0.002 })])).toBe(
      'uncertainty-zero',
    );
  });

  test('of one result is that result, though it has no uncertainty', () => {
    const combined = combine([figure(0.64, {})], 'v');
    expect(combined).toMatchObject({ weights: [1], birgeRatio: null, chiSquared: 0, sharedKeys: [] });
    expect(figureOf(combined.figure)).toMatchObject({ dragAreaM2: 0.64, standardUncertaintyM2: 0 });
  });

  const results = fc.array(
    fc.tuple(
      fc.double({ min: 0.4, max: 0.9, noNaN: true }),
      fc.double({ min: 0.001, max: 0.02, noNaN: true }),
    ),
    { minLength: 2, maxLength: 7 },
  );

  test('lies within its results, and its weights sum to 1', () => {
    fc.assert(
      fc.property(results, (values) => {
        const { figure: mean, weights } = combine(alone(values), 'v');
        const list = values.map(([value]) => value);
        expect(mean.dragAreaM2).toBeGreaterThanOrEqual(Math.min(...list) - 1e-12);
        expect(mean.dragAreaM2).toBeLessThanOrEqual(Math.max(...list) + 1e-12);
        expect(weights.reduce((sum, w) => sum + w, 0)).toBeCloseTo(1, 12);
      }),
    );
  });

  test('does not depend on the order of the results', () => {
    fc.assert(
      fc.property(results, (values) => {
        const figures = alone(values);
        const there = combine(figures, 'v');
        const back = combine([...figures].reverse(), 'v');
        expect(back.figure.dragAreaM2).toBeCloseTo(there.figure.dragAreaM2, 12);
        expect(standardUncertainty(back.figure.budget)).toBeCloseTo(
          standardUncertainty(there.figure.budget),
          12,
        );
        expect(back.randomEffectsMeanM2).toBeCloseTo(there.randomEffectsMeanM2, 12);
      }),
    );
  });

  test('has at least the internal uncertainty, and with a Birge ratio R above 1 R times it', () => {
    fc.assert(
      fc.property(results, (values) => {
        const { figure: mean, birgeRatio, internalStandardUncertaintyM2: u } = combine(alone(values), 'v');
        expect(standardUncertainty(mean.budget)).toBeCloseTo(u * Math.max(1, birgeRatio!), 12);
      }),
    );
  });
});
