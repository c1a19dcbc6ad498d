import * as fc from 'fast-check';
import type { CorrelationPairInput } from '../ranking/ranking-input';
import { correlatedDragArea, correlationAmounts, fitCorrelation } from './correlation';
import { evaluateCorrelation } from './correlation-operation';

const pair = (x: number, y: number, u = 0.003): CorrelationPairInput => ({
  dragAreaM2: x,
  uM2: u,
  referenceDragAreaM2: y,
  referenceUM2: u,
});
/** Only y uncertain: w = 1/u². */
const weighed = (x: number, y: number, u: number): CorrelationPairInput => ({
  dragAreaM2: x,
  uM2: 0,
  referenceDragAreaM2: y,
  referenceUM2: u,
});

describe('A correlation against JCGM 100:2008, example H.3 (figures as printed)', () => {
  const temperatures = [
    21.521, 22.012, 22.512, 23.003, 23.507, 23.999, 24.513, 25.002, 25.503, 26.01, 26.511,
  ];
  const corrections = [-0.171, -0.169, -0.166, -0.159, -0.164, -0.165, -0.156, -0.157, -0.159, -0.161, -0.16];
  // Equal u that are too small for the scatter: the widening then restores s, as ordinary least squares has it.
  const fit = fitCorrelation(temperatures.map((t, i) => weighed(t, corrections[i] ?? NaN, 0.001)));

  it('has the slope 0.002 18 ± 0.000 67 and the level −0.1712 at 20 °C', () => {
    expect(fit.slope).toBeCloseTo(0.00218, 5);
    expect(fit.slopeUncertainty).toBeCloseTo(0.00067, 5);
    expect(fit.interceptM2 + 20 * fit.slope).toBeCloseTo(-0.1712, 4);
    expect(fit.wideningFactor * 0.001).toBeCloseTo(0.0035, 4);
  });

  it('has u = 0.0029 at 20 °C from level and slope', () => {
    const [level, slope] = correlationAmounts(fit, 20, 'c', 'v');
    expect(Math.hypot(level?.amountM2 ?? NaN, slope?.amountM2 ?? NaN)).toBeCloseTo(0.0029, 4);
    expect(level?.degreesOfFreedom).toBe(9);
  });
});

describe('A correlation against the meta-regression of the BCG trials on latitude (figures as metafor prints them, memory)', () => {
  /** Colditz et al., JAMA 271 (1994) 698: cases and others, vaccinated and not, and latitude in degrees. */
  const trials = [
    [4, 119, 11, 128, 44],
    [6, 300, 29, 274, 55],
    [3, 228, 11, 209, 42],
    [62, 13536, 248, 12619, 52],
    [33, 5036, 47, 5761, 13],
    [180, 1361, 372, 1079, 44],
    [8, 2537, 10, 619, 19],
    [505, 87886, 499, 87892, 13],
    [29, 7470, 45, 7232, 27],
    [17, 1699, 65, 1600, 42],
    [186, 50448, 141, 27197, 18],
    [5, 2493, 3, 2338, 33],
    [27, 16886, 29, 17825, 33],
  ] as const;
  // Latitude runs the other way, so that the slope is above zero.
  const pairs = trials.map(([a, b, c, d, latitude]) =>
    weighed(
      60 - latitude,
      Math.log(a / (a + b) / (c / (c + d))),
      Math.sqrt(1 / a - 1 / (a + b) + 1 / c - 1 / (c + d)),
    ),
  );
  const fit = fitCorrelation(pairs);

  it('has the residual heterogeneity 30.7331 with 11 degrees of freedom', () => {
    expect(fit.chiSquared).toBeCloseTo(30.7331, 4);
    expect(fit.degreesOfFreedom).toBe(11);
  });

  it('has the variance between trials 0.0633 after DerSimonian and Laird', () => {
    expect(fit.betweenPairsStandardDeviationM2 ** 2).toBeCloseTo(0.0633, 4);
  });

  it('has the slope 0.0292 of the fixed-effects regression', () => {
    expect(fit.slope).toBeCloseTo(0.0292, 4);
    expect(fit.slopeUncertainty / fit.wideningFactor).toBeCloseTo(0.0027, 4);
  });
});

describe('An offset alone', () => {
  it('has the DerSimonian–Laird variance of the differences', () => {
    // Three differences 0, 1 and 5 with u = 1: Q = 14, k − 1 = 2, Σw − Σw²/Σw = 2, so τ² = 6.
    const fit = fitCorrelation([weighed(10, 10, 1), weighed(20, 21, 1), weighed(30, 35, 1)]);
    expect(fit).toMatchObject({ offsetOnly: true, slope: 1, slopeUncertainty: 0, degreesOfFreedom: 2 });
    expect(fit.interceptM2).toBeCloseTo(2, 12);
    expect(fit.chiSquared).toBeCloseTo(14, 12);
    expect(fit.betweenPairsStandardDeviationM2).toBeCloseTo(Math.sqrt(6), 12);
    expect(fit.levelUncertaintyM2).toBeCloseTo(Math.sqrt(7 / 3), 12);
  });

  it('of one pair has infinite degrees of freedom, no widening and no scatter', () => {
    expect(evaluateCorrelation({ pairs: [pair(0.6, 0.61)] })).toMatchObject({
      degreesOfFreedom: null,
      wideningFactor: 1,
      betweenPairsStandardDeviationM2: 0,
      levelUncertaintyM2: expect.closeTo(0.003 * Math.SQRT2, 14) as number,
    });
  });

  it('needs no spread', () => {
    expect(fitCorrelation([pair(0.6, 0.61), pair(0.6, 0.612)]).interceptM2).toBeCloseTo(0.011, 12);
  });
});

const anyPairs = fc
  .array(
    fc.record({
      noise: fc.double({ min: -0.004, max: 0.004, noNaN: true }),
      u: fc.double({ min: 0.001, max: 0.006, noNaN: true }),
    }),
    { minLength: 5, maxLength: 12 },
  )
  .map((list) => list.map(({ noise, u }, i) => pair(0.5 + 0.05 * i, 0.53 + 0.048 * i + noise, u)));

describe('A correlation', () => {
  it('does not depend on the order of its pairs', () => {
    fc.assert(
      fc.property(anyPairs, (pairs) => {
        const fit = fitCorrelation(pairs);
        const turned = fitCorrelation([...pairs].reverse());
        expect(turned.slope).toBeCloseTo(fit.slope, 10);
        expect(turned.betweenPairsStandardDeviationM2).toBeCloseTo(fit.betweenPairsStandardDeviationM2, 10);
      }),
    );
  });

  it('in other units of area gives the same slope and everything else in those units', () => {
    fc.assert(
      fc.property(anyPairs, fc.double({ min: 0.5, max: 20, noNaN: true }), (pairs, factor) => {
        const fit = fitCorrelation(pairs);
        const scaled = fitCorrelation(
          pairs.map((one) => ({
            dragAreaM2: one.dragAreaM2 * factor,
            uM2: one.uM2 * factor,
            referenceDragAreaM2: one.referenceDragAreaM2 * factor,
            referenceUM2: one.referenceUM2 * factor,
          })),
        );
        expect(scaled.slope).toBeCloseTo(fit.slope, 9);
        expect(scaled.levelUncertaintyM2).toBeCloseTo(fit.levelUncertaintyM2 * factor, 9);
        expect(scaled.chiSquared).toBeCloseTo(fit.chiSquared, 6);
      }),
    );
  });

  it('says level and slope as they follow from the pairs, unless the pairs scatter more than their u', () => {
    fc.assert(
      fc.property(anyPairs, (pairs) => {
        const fit = fitCorrelation(pairs);
        const at = (y: readonly number[], x: number): number =>
          correlatedDragArea(
            fitCorrelation(pairs.map((one, i) => ({ ...one, referenceDragAreaM2: y[i] ?? NaN }))),
            x,
            'c',
          );
        const y = pairs.map((one) => one.referenceDragAreaM2);
        let variance = 0;
        pairs.forEach(({ uM2, referenceUM2 }, j) => {
          const moved = (step: number) => y.map((value, i) => (i === j ? value + step : value));
          const derivative = (at(moved(1e-4), 0.6) - at(moved(-1e-4), 0.6)) / 2e-4;
          variance += derivative ** 2 * (uM2 ** 2 + referenceUM2 ** 2);
        });
        const [level, slope] = correlationAmounts(fit, 0.6, 'c', 'v');
        const u = Math.hypot(level?.amountM2 ?? NaN, slope?.amountM2 ?? NaN);
        expect(u / fit.wideningFactor).toBeCloseTo(Math.sqrt(variance), 9);
      }),
    );
  });

  it('finds no scatter where none is needed, and more as the residuals grow', () => {
    fc.assert(
      fc.property(anyPairs, fc.double({ min: 1, max: 4, noNaN: true }), (pairs, factor) => {
        const fit = fitCorrelation(pairs);
        const stretched = fitCorrelation(
          pairs.map((one) => {
            const line = fit.interceptM2 + fit.slope * one.dragAreaM2;
            return { ...one, referenceDragAreaM2: line + factor * (one.referenceDragAreaM2 - line) };
          }),
        );
        if (fit.chiSquared <= fit.degreesOfFreedom) expect(fit.betweenPairsStandardDeviationM2).toBe(0);
        expect(stretched.betweenPairsStandardDeviationM2).toBeGreaterThanOrEqual(
          fit.betweenPairsStandardDeviationM2 - 1e-12,
        );
        expect(stretched.slope).toBeCloseTo(fit.slope, 9);
      }),
    );
  });
});

describe('A correlation is refused', () => {
  const line = [0.5, 0.55, 0.6, 0.65, 0.7].map((x) => pair(x, x + 0.01));
  const figure = { dragAreaM2: 0.6, contributions: [] };

  it.each<readonly [string, string, () => unknown]>([
    ['without a pair', 'correlation-too-few-pairs', () => fitCorrelation([])],
    ['with a pair that has no u', 'uncertainty-zero', () => fitCorrelation([...line, pair(0.8, 0.8, 0)])],
    [
      'whose pairs all have one drag area',
      'correlation-no-spread',
      () => fitCorrelation(line.map((one) => ({ ...one, dragAreaM2: 0.6 }))),
    ],
    [
      'with a negative slope',
      'correlation-negative-slope',
      () => fitCorrelation(line.map((one) => ({ ...one, referenceDragAreaM2: 1.2 - one.dragAreaM2 }))),
    ],
    [
      'with a slope of zero',
      'correlation-negative-slope',
      () => fitCorrelation(line.map((one) => ({ ...one, referenceDragAreaM2: 0.6 }))),
    ],
    ['below its pairs', 'correlation-range', () => correlatedDragArea(fitCorrelation(line), 0.4999, 'c')],
    ['above its pairs', 'correlation-range', () => correlatedDragArea(fitCorrelation(line), 0.7001, 'c')],
    [
      'for a figure without the correlation’s id',
      'missing-input',
      () => evaluateCorrelation({ pairs: line, figure, variantId: 'v' }),
    ],
    [
      'for a figure without its variant',
      'missing-input',
      () => evaluateCorrelation({ pairs: line, figure, correlationId: 'c' }),
    ],
  ])('%s: %s', (_what, code, attempt) => {
    expect(attempt).toThrow(expect.objectContaining({ code }));
  });

  it('not at the very ends of its pairs, nor where one side of a pair is known exactly', () => {
    const fit = fitCorrelation(line);
    expect(correlatedDragArea(fit, 0.5, 'c')).toBeCloseTo(0.51, 12);
    expect(correlatedDragArea(fit, 0.7, 'c')).toBeCloseTo(0.71, 12);
    expect(fitCorrelation([weighed(0.6, 0.61, 0.002)]).levelUncertaintyM2).toBeCloseTo(0.002, 14);
  });
});
