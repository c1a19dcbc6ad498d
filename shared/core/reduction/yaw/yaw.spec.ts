import * as fc from 'fast-check';
import { KMH_PER_MS, DEFAULT_WIND_SPEED_MS } from '../../constants';
import { evenInterpolant } from './even-interpolant';
import { windAverage, windNode, windNodes } from './wind-average';
import { evaluateYaw } from './yaw-ratio';
import type { YawPoint } from './yaw-points';

const within = (found: number, expected: number, allowed: number): void =>
  expect(Math.abs(found - expected)).toBeLessThanOrEqual(allowed);

describe('The wind average after SAE J1252 (form from memory; figures computed)', () => {
  it.each([
    [
      100,
      11,
      [1.224604, 1.167663, 1.06904, 0.95516, 0.856537, 0.799596],
      [1.4742, 4.1278, 5.8983, 6.2414, 4.821, 1.8245],
      1.0121,
    ],
    [
      65,
      7,
      [1.219643, 1.163898, 1.067343, 0.955852, 0.859298, 0.803552],
      [1.4462, 4.0476, 5.7788, 6.1077, 4.7121, 1.7818],
      1.011598,
    ],
    [
      55,
      7,
      [1.26207, 1.196189, 1.08208, 0.950317, 0.836208, 0.770326],
      [1.6803, 4.7199, 6.7872, 7.2448, 5.6479, 2.1509],
      1.016198,
    ],
  ])(
    'at speed %d and wind %d has the weights and angles of the table',
    (speed, wind, weights, angles, mean) => {
      const nodes = windNodes(wind / speed);
      nodes.forEach((node, i) => {
        within(node.weight / (weights[i] ?? NaN), 1, 1e-4);
        within(node.yawDeg / (angles[i] ?? NaN), 1, 1e-4);
      });
      within(
        windAverage(nodes, () => 1),
        mean,
        1e-4,
      );
      within((Math.asin(wind / speed) * 180) / Math.PI, Math.max(...angles), 0.1);
    },
  );

  it('scores a body indifferent to yaw C·(1 + r²): 1.0121 at 100 and 11 km/h', () => {
    within(windAverage(windNodes(0.11), () => 0.3) / 0.3, 1.0121, 1e-9);
    fc.assert(
      fc.property(
        fc.double({ min: 0, max: 0.99, noNaN: true }),
        fc.double({ min: 0.1, max: 2, noNaN: true }),
        (r, c) => Math.abs(windAverage(windNodes(r), () => c) / (c * (1 + r * r)) - 1) < 1e-13,
      ),
    );
  });

  it('makes 0.649763 of C = 0.6·(1 + 0.0025·ψ²) at 55 and 7 mph (computed)', () => {
    const average = windAverage(windNodes(7 / 55), (yaw) => 0.6 * (1 + 0.0025 * yaw * yaw));
    within(average / 0.649763, 1, 1e-6);
  });

  it('has the resultant of 40 CFR 1037.528: 69.93 mph and 4.26° from 64.9 and 7.1 mph at 47° (the text truncates)', () => {
    const node = windNode(7.1 / 64.9, 47);
    within(64.9 * Math.sqrt(node.weight), 69.93, 0.01);
    within(node.yawDeg, 4.26, 0.005);
  });

  it('takes 7 mph where no wind is given (memory)', () => {
    within(DEFAULT_WIND_SPEED_MS, 7 * 0.44704, 1e-12);
  });
});

describe('The interpolation', () => {
  it.each([
    [
      [0, 3, 6, 9],
      [0.6401, 0.6407, 0.6489, 0.6488],
      [0.3, 1.1, 2.6, 3.7, 8.73],
      [0.6401067363636364, 0.6401876333333334, 0.6405588606060607, 0.6419843491582492, 0.6488246429000001],
    ],
    [
      [0, 2.5, 5, 7.5, 10],
      [0.3, 0.31, 0.305, 0.34, 0.38],
      [0.3, 1.1, 2.6, 3.7, 9.7],
      [0.30039744, 0.30410432, 0.30997664, 0.30764992, 0.374933888],
    ],
    [
      [0, 1, 8],
      [0.64, 0.7, 0.69],
      [0.3, 1.1, 2.6, 3.7, 7.76],
      [0.65296, 0.699999970845481, 0.6998805830903789, 0.6994261516034985, 0.6909937091545189],
    ],
    [
      [0, 4, 5, 12, 15],
      [0.5, 0.5, 0.52, 0.52, 0.6],
      [0.3, 1.1, 2.6, 3.7, 14.55],
      [0.5, 0.5, 0.5, 0.5, 0.583869],
    ],
    [
      [0, 2, 4],
      [0.7, 0.69, 0.6],
      [0.3, 1.1, 2.6, 3.7, 3.88],
      [0.69973675, 0.69670275, 0.676104, 0.619212, 0.607764288],
    ],
  ])('of %j equals SciPy 1.17.1 PchipInterpolator on the mirrored nodes', (x, y, at, values) => {
    const f = evenInterpolant(x, y);
    at.forEach((position, i) => {
      within(f(position), values[i] ?? NaN, 1e-13);
      expect(f(-position)).toBe(f(position));
    });
  });

  it('keeps within its neighbours: no overshoot', () => {
    const values = fc.array(fc.double({ min: 0.2, max: 1, noNaN: true }), { minLength: 3, maxLength: 8 });
    fc.assert(
      fc.property(values, fc.double({ min: 0, max: 1, noNaN: true }), (y, share) => {
        const x = y.map((_, i) => 2 * i + (i > 1 ? 0.5 : 0));
        const at = share * (x.at(-1) ?? 0);
        const i = Math.min(y.length - 2, x.filter((node) => node <= at).length - 1);
        const sides = [y[i] ?? NaN, y[i + 1] ?? NaN];
        const found = evenInterpolant(x, y)(at);
        return found >= Math.min(...sides) - 1e-12 && found <= Math.max(...sides) + 1e-12;
      }),
    );
  });
});

describe('A yaw sweep', () => {
  const point = (yawDeg: number, dragAreaM2: number, uM2 = 0.001): YawPoint => ({ yawDeg, dragAreaM2, uM2 });
  const sweep = [point(-8, 0.68), point(-4, 0.65), point(0, 0.64), point(4, 0.652), point(8, 0.684)];

  it('gives the same when left and right are exchanged', () => {
    const mirrored = sweep.map((one) => ({ ...one, yawDeg: -one.yawDeg }));
    const [a, b] = [sweep, mirrored].map((points) => evaluateYaw({ points, referenceSpeedKmh: 120 }));
    within(a?.yawRatio ?? NaN, b?.yawRatio ?? 0, 1e-15);
    expect(a?.foldedDragAreaM2).toEqual(b?.foldedDragAreaM2);
  });

  it('scores 1 + r² where the drag does not depend on yaw', () => {
    const flat = sweep.map((one) => ({ ...one, dragAreaM2: 0.64 }));
    const r = (DEFAULT_WIND_SPEED_MS * KMH_PER_MS) / 120;
    within(evaluateYaw({ points: flat, referenceSpeedKmh: 120 }).yawRatio, 1 + r * r, 1e-14);
  });

  it('does not depend on the size of the body', () => {
    fc.assert(
      fc.property(fc.double({ min: 0.01, max: 100, noNaN: true }), (size) => {
        const larger = sweep.map((one) => point(one.yawDeg, one.dragAreaM2 * size, one.uM2 * size));
        const [a, b] = [sweep, larger].map((points) => evaluateYaw({ points, referenceSpeedKmh: 120 }));
        within(a?.yawRatio ?? NaN, b?.yawRatio ?? 0, 1e-12);
        within(a?.zeroPointAmount ?? NaN, b?.zeroPointAmount ?? 0, 1e-12);
      }),
    );
  });

  it('warns of an unpaired side only where pairs elsewhere differ by more than they may', () => {
    const cautionsOf = (points: readonly YawPoint[]) =>
      evaluateYaw({ points, referenceSpeedKmh: 120 }).cautions;
    const oneSided = [point(0, 0.64), point(4, 0.65), point(8, 0.68)];
    expect(cautionsOf(oneSided)).toEqual([]);
    expect(cautionsOf([...oneSided, point(-4, 0.6525)])).toEqual([]);
    expect(cautionsOf([...oneSided, point(-4, 0.656)])).toEqual(['unpaired-yaw-in-unsymmetrical-sweep']);
  });

  it('is refused in a set order: angles, zero, wind, reach', () => {
    const codeOf = (points: readonly YawPoint[], windSpeedMs?: number): string => {
      try {
        return String(evaluateYaw({ points, referenceSpeedKmh: 120, windSpeedMs }).yawRatio);
      } catch (error) {
        return (error as { readonly code: string }).code;
      }
    };
    expect(codeOf([point(2, 0.6), point(-2, 0.6), point(4, 0.6)], 99)).toBe('yaw-too-few-angles');
    expect(codeOf([point(2, 0.6), point(3, 0.6), point(4, 0.6)], 99)).toBe('yaw-no-zero');
    expect(codeOf([point(0, 0.6), point(3, 0.6), point(4, 0.6)], 99)).toBe('wind-ratio');
    expect(codeOf([point(0, 0.6), point(3, 0.6), point(4, 0.6)])).toBe('yaw-extrapolation');
  });
});
