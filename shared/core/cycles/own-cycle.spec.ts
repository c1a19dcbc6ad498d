import fc from 'fast-check';
import { type Refused } from '../refusal';
import { checkOwnCycle, type OwnCycleRows } from './own-cycle';

const rows = (given: Partial<OwnCycleRows>): OwnCycleRows => ({
  time: [0, 10, 20, 30],
  timeUnit: 's',
  speed: [0, 36, 36, 0],
  speedUnit: 'km/h',
  ...given,
});
const cautionsOf = (given: Partial<OwnCycleRows>) => checkOwnCycle(rows(given)).cautions;

test('The totals of a trapezium are those of school', () => {
  expect(checkOwnCycle(rows({})).totals).toEqual({
    rows: 4,
    durationS: 30,
    distanceM: 200,
    maximumSpeedKmh: 36,
    meanSpeedKmh: 24,
    maximumAccelerationMs2: 1,
    maximumDecelerationMs2: 1,
    standingS: 0,
  });
});

test('Minutes and metres per second are the same trace as seconds and kilometres per hour', () => {
  const inMinutes = checkOwnCycle(
    rows({ time: [0, 1, 2, 3], timeUnit: 'min', speed: [0, 10, 10, 0], speedUnit: 'm/s' }),
  );
  const inSeconds = checkOwnCycle(rows({ time: [0, 60, 120, 180] }));
  expect(inMinutes.trace).toEqual(inSeconds.trace);
  expect(inMinutes.totals).toEqual(inSeconds.totals);
});

test('60 mph is 96.560 64 km/h', () => {
  expect(checkOwnCycle(rows({ speed: [0, 60, 60, 0], speedUnit: 'mph' })).totals.maximumSpeedKmh).toBeCloseTo(
    96.56064,
    12,
  );
});

test('Whatever the unit of speed, the distance scales with it and the duration stays', () => {
  fc.assert(
    fc.property(fc.array(fc.integer({ min: 1, max: 50 }), { minLength: 2, maxLength: 30 }), (speed) => {
      const time = speed.map((_, i) => i);
      const metric = checkOwnCycle({ time, timeUnit: 's', speed, speedUnit: 'km/h' }).totals;
      const imperial = checkOwnCycle({ time, timeUnit: 's', speed, speedUnit: 'mph' }).totals;
      expect(imperial.distanceM / metric.distanceM).toBeCloseTo(1.609344, 12);
      expect(imperial.durationS).toBe(metric.durationS);
    }),
  );
});

test('Standing time counts steps that begin and end at rest', () => {
  expect(checkOwnCycle(rows({ speed: [0, 0, 36, 0] })).totals.standingS).toBe(10);
});

describe('Cautions', () => {
  test('A plausible trace that begins and ends at rest has none', () => {
    expect(cautionsOf({})).toEqual([]);
  });

  test('Speeds in m/s read as mph are noticed by nobody, but 0 to 100 km/h in a second is', () => {
    expect(cautionsOf({ time: [0, 1, 2, 12], speed: [0, 100, 100, 0] })).toEqual([
      { code: 'implausible-acceleration', row: 2, count: 1, extreme: 100 / 3.6 },
    ]);
  });

  test('Braking beyond 5 m/s² counts too, and the most extreme of several is told', () => {
    const [caution] = cautionsOf({ time: [0, 1, 2, 3], speed: [0, 20, 80, 0] });
    expect(caution).toMatchObject({ code: 'implausible-acceleration', row: 2, count: 3 });
    expect(caution?.extreme).toBeCloseTo(-80 / 3.6, 12);
  });

  test('Exactly 5 m/s² and exactly 300 km/h pass', () => {
    expect(cautionsOf({ time: [0, 1, 2, 3], speed: [0, 18, 18, 0] })).toEqual([]);
    expect(
      cautionsOf({ time: [0, 1, 2, 3], timeUnit: 'min', speed: [0, 300, 300, 0] }).map(({ code }) => code),
    ).toEqual(['time-gap']);
  });

  test('A speed above 300 km/h is named by its row', () => {
    expect(cautionsOf({ time: [0, 100, 200], timeUnit: 's', speed: [0, 301, 0] })).toContainEqual({
      code: 'implausible-speed',
      row: 2,
      count: 1,
      extreme: 301,
    });
  });

  test('A gap of more than 10 s is named by the row after it', () => {
    expect(cautionsOf({ time: [0, 10, 21, 31] })).toEqual([
      { code: 'time-gap', row: 3, count: 1, extreme: 11 },
    ]);
  });

  test('A trace that begins or ends in motion is told', () => {
    expect(cautionsOf({ speed: [36, 36, 36, 20] })).toEqual([
      { code: 'starts-moving', row: 1, count: 1, extreme: 36 },
      { code: 'ends-moving', row: 4, count: 1, extreme: 20 },
    ]);
  });
});

test.each([
  ['malformed-input', { speed: [0, 1] }],
  ['cycle-too-short', { time: [0], speed: [3] }],
  ['cycle-time-not-increasing', { time: [0, 10, 10, 30] }],
  ['cycle-negative-speed', { speed: [0, -36, 36, 0] }],
  ['cycle-standing', { speed: [0, 0, 0, 0] }],
])('It refuses with %s what no cycle can be', (code, given) => {
  expect(() => checkOwnCycle(rows(given))).toThrow(expect.objectContaining({ code }) as Refused);
});
