import fc from 'fast-check';
import { type Refused } from '../refusal';
import { constantSpeedCycle, prepareCycle } from './cycle';
import { traceOf } from './cycle-input';

const refusedWith = (code: string, where?: string) =>
  expect.objectContaining(where === undefined ? { code } : { code, where }) as Refused;

describe('prepareCycle', () => {
  test('A step has its duration, mean speed, acceleration and distance', () => {
    const cycle = prepareCycle({ timeS: [10, 11, 13], speedKmh: [0, 18, 18] });
    expect(cycle.steps).toBe(2);
    expect(cycle.durationS).toBe(3);
    expect(Array.from(cycle.stepS)).toEqual([1, 2]);
    expect(Array.from(cycle.meanSpeedKmh)).toEqual([9, 18]);
    expect(Array.from(cycle.accelerationMs2)).toEqual([5, 0]);
    expect(Array.from(cycle.stepDistanceM)).toEqual([2.5, 10]);
    expect(cycle.distanceM).toBe(12.5);
  });

  test('By falling acceleration the steps are the same, each with its own speed and distance', () => {
    const cycle = prepareCycle({ timeS: [0, 1, 2, 4, 5], speedKmh: [0, 18, 9, 9, 45] });
    const { byAcceleration } = cycle;
    expect(Array.from(byAcceleration.accelerationMs2)).toEqual([10, 5, 0, -2.5]);
    expect(Array.from(byAcceleration.meanSpeedKmh)).toEqual([27, 9, 9, 13.5]);
    expect(Array.from(byAcceleration.stepDistanceM)).toEqual([7.5, 2.5, 5, 3.75]);
  });

  test('Only a step that begins and ends at 0 km/h stands', () => {
    const cycle = prepareCycle({ timeS: [0, 1, 2, 3, 4], speedKmh: [0, 0, 5, 0, 0] });
    expect(Array.from(cycle.standing)).toEqual([1, 0, 0, 1]);
  });

  test('Typed arrays are read like lists', () => {
    const list = { timeS: [0, 1, 2], speedKmh: [0, 4, 2] };
    const typed = { timeS: Float64Array.from(list.timeS), speedKmh: Float64Array.from(list.speedKmh) };
    expect(prepareCycle(typed)).toEqual(prepareCycle(list));
  });

  test.each([
    ['cycle-too-short', 'cycle', [], []],
    ['cycle-too-short', 'cycle', [0], [5]],
    ['cycle-time-not-increasing', 'cycle row 3', [0, 1, 1, 2], [0, 5, 8, 10]],
    ['cycle-time-not-increasing', 'cycle row 2', [1, 0], [5, 5]],
    ['cycle-time-not-increasing', 'cycle row 2', [0, NaN, 2], [5, 5, 5]],
    ['cycle-negative-speed', 'cycle row 1', [0, 1], [-0.1, 5]],
    ['cycle-negative-speed', 'cycle row 2', [0, 1], [0, NaN]],
    ['cycle-standing', 'cycle', [0, 1, 2], [0, 0, 0]],
    ['malformed-input', 'cycle.speedKmh', [0, 1, 2], [0, 5]],
  ])('It refuses with %s at %s: times %j, speeds %j', (code, where, timeS, speedKmh) => {
    expect(() => prepareCycle({ timeS, speedKmh })).toThrow(refusedWith(code, where));
  });

  test('Time that does not increase is said before a negative speed', () => {
    expect(() => prepareCycle({ timeS: [0, 0], speedKmh: [-1, 2] })).toThrow(
      refusedWith('cycle-time-not-increasing'),
    );
  });

  test('The distance does not depend on when the clock starts', () => {
    fc.assert(
      fc.property(
        fc.array(fc.integer({ min: 1, max: 130 }), { minLength: 2, maxLength: 40 }),
        fc.integer({ min: -1000, max: 1000 }),
        (speedKmh, start) => {
          const from = (first: number) =>
            prepareCycle({ timeS: speedKmh.map((_, i) => first + i), speedKmh });
          expect(from(start)).toEqual(from(0));
        },
      ),
    );
  });
});

describe('constantSpeedCycle', () => {
  test('It is one step without acceleration', () => {
    const cycle = prepareCycle(constantSpeedCycle(90, 120));
    expect(cycle.steps).toBe(1);
    expect(cycle.accelerationMs2[0]).toBe(0);
    expect(cycle.distanceM).toBe(3000);
    expect(cycle.durationS).toBe(120);
  });

  test.each([
    [0, 10, 'cycle.constantSpeedKmh'],
    [-5, 10, 'cycle.constantSpeedKmh'],
    [NaN, 10, 'cycle.constantSpeedKmh'],
    [50, 0, 'cycle.durationS'],
  ])('%f km/h over %f s is refused at %s', (speed, duration, where) => {
    expect(() => constantSpeedCycle(speed, duration)).toThrow(refusedWith('not-positive', where));
  });
});

describe('traceOf', () => {
  const known = { timeS: [0, 1], speedKmh: [0, 10] };
  const builtIn = (name: string) => (name === 'known' ? known : undefined);

  test('A name stands for the rows of the collection', () => {
    expect(traceOf('known', builtIn)).toBe(known);
  });

  test('A name that the collection does not hold is refused', () => {
    expect(() => traceOf('elsewhere', builtIn)).toThrow(refusedWith('unknown-cycle', 'cycle'));
  });

  test('A constant speed and own rows need no collection', () => {
    expect(traceOf({ constantSpeedKmh: 50, durationS: 4 }, builtIn)).toEqual(constantSpeedCycle(50, 4));
    const own = { timeS: [0, 2], speedKmh: [3, 4] };
    expect(traceOf(own, builtIn)).toBe(own);
  });
});
