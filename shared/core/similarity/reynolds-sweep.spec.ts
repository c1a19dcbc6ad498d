import * as fc from 'fast-check';
import { fitSweep, judgeSweep, moveAlongSweep, predictFromSweep, type SweepPoint } from './reynolds-sweep';
import { evaluateReynoldsSweep } from './reynolds-sweep-operation';
import { reynoldsOfSkinFriction, skinFriction } from './skin-friction';

/**
 * A straight line in any x as a sweep: x is laid on c_f = from + scale·x, and the Reynolds number is the one that has it.
 * So published examples of ordinary least squares go through the product's own fit.
 */
function laidOnFriction(
  pairs: readonly (readonly [y: number, x: number])[],
  from: number,
  scale: number,
): SweepPoint[] {
  return pairs.map(([y, x]) => ({ reynolds: reynoldsOfSkinFriction(from + scale * x), dragAreaM2: y }));
}

/** NIST StRD, linear regression, data set Norris (calibration of ozone monitors): y, x. */
const NORRIS: readonly (readonly [number, number])[] = [
  [0.1, 0.2],
  [338.8, 337.4],
  [118.1, 118.2],
  [888.0, 884.6],
  [9.2, 10.1],
  [228.1, 226.5],
  [668.5, 666.3],
  [998.5, 996.3],
  [449.1, 448.6],
  [778.9, 777.0],
  [559.2, 558.2],
  [0.3, 0.4],
  [0.1, 0.6],
  [778.1, 775.5],
  [668.8, 666.9],
  [339.3, 338.0],
  [448.9, 447.5],
  [10.8, 11.6],
  [557.7, 556.0],
  [228.3, 228.1],
  [998.0, 995.8],
  [888.8, 887.6],
  [119.6, 120.2],
  [0.3, 0.3],
  [0.6, 0.3],
  [557.6, 556.8],
  [339.3, 339.1],
  [888.0, 887.2],
  [998.5, 999.0],
  [778.9, 779.0],
  [10.2, 11.1],
  [117.6, 118.3],
  [228.9, 229.2],
  [668.4, 669.1],
  [449.2, 448.9],
  [0.2, 0.5],
];

const relative = (found: number, expected: number): number => Math.abs(found / expected - 1);

describe('A sweep’s fit against NIST StRD, Norris (certified values)', () => {
  const from = 0.001;
  const scale = 2e-5;
  const output = evaluateReynoldsSweep({
    points: laidOnFriction(NORRIS, from, scale),
    referenceReynolds: 1e6,
    toleranceM2: 1,
  });

  it('has the certified slope and its standard error', () => {
    expect(relative(output.slopeM2 * scale, 1.00211681802045)).toBeLessThan(1e-10);
    expect(relative(output.slopeStandardErrorM2 * scale, 0.429796848199937e-3)).toBeLessThan(1e-9);
  });

  it('has the certified intercept and its standard error, carried from c_f to x = 0', () => {
    const atZero = output.interceptM2 + output.slopeM2 * from;
    const variance =
      output.interceptVarianceM4 + from * from * output.slopeVarianceM4 + 2 * from * output.covarianceM4;
    expect(relative(atZero, -0.262323073774029)).toBeLessThan(1e-9);
    expect(relative(Math.sqrt(variance), 0.232818234301152)).toBeLessThan(1e-9);
  });

  it('has the certified residual standard deviation with 34 degrees of freedom', () => {
    expect(relative(output.residualStandardDeviationM2, 0.884796396144373)).toBeLessThan(1e-9);
    expect(output.degreesOfFreedom).toBe(34);
  });
});

describe('A sweep’s fit against JCGM 100:2008, example H.3 (calibration of a thermometer, figures as printed)', () => {
  const temperatures = [
    21.521, 22.012, 22.512, 23.003, 23.507, 23.999, 24.513, 25.002, 25.503, 26.01, 26.511,
  ];
  const corrections = [-0.171, -0.169, -0.166, -0.159, -0.164, -0.165, -0.156, -0.157, -0.159, -0.161, -0.16];
  const from = 0.001;
  const scale = 2e-4;
  const pairs = temperatures.map((t, i) => [corrections[i] ?? NaN, t] as const);
  const fit = fitSweep(laidOnFriction(pairs, from, scale));
  const at = (t: number) => predictFromSweep(fit, reynoldsOfSkinFriction(from + scale * t), 'reference');

  it('has slope 0.002 18 ± 0.000 67 and s = 0.0035', () => {
    expect(fit.slopeM2 * scale).toBeCloseTo(0.00218, 5);
    expect(fit.slopeUncertaintyM2 * scale).toBeCloseTo(0.00067, 5);
    expect(fit.residualStandardDeviationM2).toBeCloseTo(0.0035, 4);
  });

  it('predicts −0.1712 ± 0.0029 at 20 °C and −0.1494 ± 0.0041 at 30 °C, from level and slope', () => {
    const low = at(20);
    const high = at(30);
    expect(low.dragAreaM2).toBeCloseTo(-0.1712, 4);
    expect(Math.hypot(low.levelAmountM2, low.slopeAmountM2)).toBeCloseTo(0.0029, 4);
    expect(high.dragAreaM2).toBeCloseTo(-0.1494, 4);
    expect(Math.hypot(high.levelAmountM2, high.slopeAmountM2)).toBeCloseTo(0.0041, 4);
  });
});

const sweepOf = (values: readonly number[], start = 1.2e6, factor = 1.5): SweepPoint[] =>
  values.map((dragAreaM2, i) => ({ reynolds: start * factor ** i, dragAreaM2 }));
const anySweep = fc
  .array(fc.double({ min: 0.5, max: 0.8, noNaN: true }), { minLength: 4, maxLength: 9 })
  .map((values) => sweepOf(values));

describe('A sweep', () => {
  it('on the line is followed exactly', () => {
    const points = sweepOf([1, 1, 1, 1, 1]).map(({ reynolds }) => ({
      reynolds,
      dragAreaM2: 0.6 + 12 * skinFriction(reynolds),
    }));
    const fit = fitSweep(points);
    expect(fit.slopeM2).toBeCloseTo(12, 8);
    expect(fit.interceptM2).toBeCloseTo(0.6, 10);
    expect(moveAlongSweep(fit, 2e6, 1e7, { test: 'a', reference: 'b' }).shiftM2).toBeCloseTo(
      12 * (skinFriction(1e7) - skinFriction(2e6)),
      10,
    );
  });

  it('has weights that sum to 1 and give its prediction', () => {
    fc.assert(
      fc.property(anySweep, (points) => {
        const { weights, dragAreaM2 } = predictFromSweep(fitSweep(points), 5e6, 'reference');
        expect(weights.reduce((sum, h) => sum + h, 0)).toBeCloseTo(1, 10);
        expect(points.reduce((sum, point, i) => sum + point.dragAreaM2 * (weights[i] ?? NaN), 0)).toBeCloseTo(
          dragAreaM2,
          10,
        );
      }),
    );
  });

  it('does not depend on the order of its points', () => {
    fc.assert(
      fc.property(anySweep, (points) => {
        const fit = fitSweep(points);
        const turned = fitSweep([...points].reverse());
        expect(turned.slopeM2).toBeCloseTo(fit.slopeM2, 8);
        expect(turned.residualStandardDeviationM2).toBeCloseTo(fit.residualStandardDeviationM2, 10);
      }),
    );
  });

  it('in square feet gives square feet: every area scales alike', () => {
    const perSquareMetre = 10.763910416709722;
    fc.assert(
      fc.property(anySweep, (points) => {
        const fit = fitSweep(points);
        const scaled = fitSweep(
          points.map((point) => ({ ...point, dragAreaM2: point.dragAreaM2 * perSquareMetre })),
        );
        expect(scaled.slopeM2).toBeCloseTo(fit.slopeM2 * perSquareMetre, 6);
        expect(scaled.slopeUncertaintyM2).toBeCloseTo(fit.slopeUncertaintyM2 * perSquareMetre, 6);
      }),
    );
  });

  it('accepts a lower Reynolds number as the tolerance grows, never below its own lowest', () => {
    fc.assert(
      fc.property(
        anySweep,
        fc.double({ min: 1e-4, max: 0.02, noNaN: true }),
        fc.double({ min: 1, max: 5, noNaN: true }),
        (points, tolerance, wider) => {
          const fit = fitSweep(points);
          const tight = judgeSweep(fit, 1e7, tolerance, 2e6);
          const loose = judgeSweep(fit, 1e7, tolerance * wider, 2e6);
          expect(loose.lowestReynoldsWithinTolerance).toBeLessThanOrEqual(
            tight.lowestReynoldsWithinTolerance,
          );
          expect(tight.lowestReynoldsWithinTolerance).toBeGreaterThanOrEqual(fit.lowestReynolds);
          if (tight.flatWithinTolerance) expect(loose.flatWithinTolerance).toBe(true);
        },
      ),
    );
  });

  it('from which the tolerance is used up says so: at its lowest Reynolds number the move is the tolerance', () => {
    const fit = fitSweep(sweepOf([0.684, 0.677, 0.672, 0.668, 0.666]));
    const { lowestReynoldsWithinTolerance, lowestReynoldsIsSweepStart } = judgeSweep(fit, 1e7, 0.004, 2e6);
    expect(lowestReynoldsIsSweepStart).toBe(false);
    const move = fit.slopeM2 * (skinFriction(lowestReynoldsWithinTolerance) - skinFriction(1e7));
    expect(move).toBeCloseTo(0.004, 12);
  });

  it('clears the caution only where it is flat and reaches above the minimum', () => {
    const flat = fitSweep(sweepOf([0.6, 0.6001, 0.6, 0.6001]));
    const steep = fitSweep(sweepOf([0.68, 0.66, 0.645, 0.63]));
    const low = fitSweep(sweepOf([0.6, 0.6001, 0.6, 0.6001], 0.4e6));
    expect(judgeSweep(flat, 1e7, 0.005, 2e6)).toMatchObject({
      flatWithinTolerance: true,
      clearsTransitionCaution: true,
    });
    expect(judgeSweep(steep, 1e7, 0.005, 2e6).clearsTransitionCaution).toBe(false);
    expect(judgeSweep(low, 1e7, 0.005, 2e6)).toMatchObject({
      flatWithinTolerance: true,
      clearsTransitionCaution: false,
    });
    expect(judgeSweep(flat, 1e7, 0.005, flat.highestReynolds).clearsTransitionCaution).toBe(false);
  });

  it('without a slope starts at its own lowest Reynolds number', () => {
    const level = judgeSweep(fitSweep(sweepOf([0.5, 0.5, 0.5, 0.5])), 1e7, 0.005, 2e6);
    expect(level).toMatchObject({ lowestReynoldsWithinTolerance: 1.2e6, lowestReynoldsIsSweepStart: true });
  });
});

describe('A sweep is refused', () => {
  const good = sweepOf([0.68, 0.67, 0.665, 0.66]);
  const op = (points: readonly SweepPoint[], changes: object = {}) =>
    evaluateReynoldsSweep({ points, referenceReynolds: 6e6, toleranceM2: 0.005, ...changes });

  it.each<readonly [string, string, () => unknown]>([
    ['with two points', 'sweep-too-few-points', () => op(good.slice(0, 2))],
    ['with three points', 'sweep-too-few-points', () => op(good.slice(0, 3))],
    ['of equal Reynolds numbers', 'sweep-too-narrow', () => op(sweepOf([0.68, 0.67, 0.665, 0.66], 2e6, 1))],
    ['below a ratio of 1.5', 'sweep-too-narrow', () => op(sweepOf([0.68, 0.67, 0.665, 0.66], 2e6, 1.14))],
    ['far from the reference', 'sweep-extrapolation', () => op(good, { referenceReynolds: 4e7 })],
    [
      'far from the result',
      'sweep-extrapolation',
      () => op(good, { result: { reynolds: 2e5, dragAreaM2: 0.7 } }),
    ],
    ['at a mistyped Reynolds number', 'reynolds-out-of-range', () => op(sweepOf([1, 1, 1, 1], 900, 1.5))],
    ['for a mistyped reference', 'reynolds-out-of-range', () => op(good, { referenceReynolds: 10 })],
    ['without a tolerance', 'not-positive', () => op(good, { toleranceM2: 0 })],
  ])('%s: %s', (_what, code, attempt) => {
    expect(attempt).toThrow(expect.objectContaining({ code }));
  });

  it('is used from a ratio of 1.5 on, and to the edge of its span', () => {
    expect(
      op(sweepOf([0.68, 0.67, 0.665, 0.66], 2e6, 1.1447143), { referenceReynolds: 4e6 }).degreesOfFreedom,
    ).toBe(2);
    const fit = fitSweep(good);
    const edge = reynoldsOfSkinFriction(2 * fit.lowestFriction - fit.highestFriction + 1e-12);
    expect(op(good, { referenceReynolds: edge }).degreesOfFreedom).toBe(2);
    expect(() => op(good, { referenceReynolds: edge * 1.001 })).toThrow('sweep-extrapolation');
  });
});
