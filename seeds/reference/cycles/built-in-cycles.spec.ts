import { prepareCycle, type PreparedCycle } from '#shared/core/cycles/cycle';
import { cycleTotals } from '#shared/core/cycles/own-cycle';
import { KM_PER_MILE } from '#shared/core/constants';
import {
  BUILT_IN_CYCLE_NAMES,
  BUILT_IN_CYCLES,
  builtInCycle,
  type BuiltInCycleName,
} from './built-in-cycles';
import {
  EXTRA_URBAN_OPERATIONS,
  traceOfOperations,
  URBAN_OPERATIONS,
  type Activity,
  type Operation,
} from './nedc';

const totalsOf = (name: BuiltInCycleName) => {
  const trace = builtInCycle(name);
  return cycleTotals(trace, prepareCycle(trace));
};

const distanceBetween = (cycle: PreparedCycle, fromS: number, toS: number): number =>
  cycle.stepDistanceM.slice(fromS, toS).reduce((sum, distance) => sum + distance, 0);

/** Σ of the speeds of the rows after `fromS` up to `toS`, in whole tenths of km/h. */
const sumOfTenths = (name: BuiltInCycleName, fromS: number, toS: number): number =>
  Array.from(builtInCycle(name).speedKmh)
    .slice(fromS + 1, toS + 1)
    .reduce((sum, speed) => sum + Math.round(speed * 10), 0);

const WLTC_BOUNDARIES = [0, 589, 1022, 1477, 1800] as const;

describe('Every built-in cycle', () => {
  test.each(BUILT_IN_CYCLE_NAMES)(
    '%s has one row a second from t = 0 and begins and ends at rest',
    (name) => {
      const { timeS, speedKmh } = builtInCycle(name);
      expect(Array.from(timeS)).toEqual(Array.from({ length: speedKmh.length }, (_, second) => second));
      expect([speedKmh[0], speedKmh[speedKmh.length - 1]]).toEqual([0, 0]);
    },
  );

  test.each(BUILT_IN_CYCLES.map((cycle) => [cycle.name, cycle] as const))(
    'The phases of %s follow each other from the first to the last second',
    (name, { phases }) => {
      const { timeS } = builtInCycle(name);
      expect(phases.map((phase) => phase.fromS)).toEqual([
        0,
        ...phases.slice(0, -1).map((phase) => phase.toS),
      ]);
      expect(phases.at(-1)?.toS).toBe(timeS[timeS.length - 1]);
    },
  );

  test('The list holds each name once, with a title and a source', () => {
    expect(BUILT_IN_CYCLES.map((cycle) => cycle.name)).toEqual([...BUILT_IN_CYCLE_NAMES]);
    for (const { title, source } of BUILT_IN_CYCLES) expect(`${title}${source}`).toMatch(/\w+.*\w+/);
  });

  test.each(['wltc', 'NEDC', '', 'toString', '__proto__'])('“%s” is not one of them', (name) => {
    expect(builtInCycle(name)).toBeUndefined();
  });

  // Duration and trapezoidal distance as the method's machine entry states them.
  test.each([
    ['wltc-class-3b', 1800, 23266.2778],
    ['wltc-class-3a', 1800, 23193.5833],
    ['udds', 1369, 11990.2387],
    ['hwfet', 765, 16506.5497],
    ['us06', 600, 12887.582],
    ['nedc', 1180, 11013.1944],
  ] as const)('%s takes %i s over %f m', (name, durationS, distanceM) => {
    const totals = totalsOf(name);
    expect(totals.durationS).toBe(durationS);
    expect(totals.distanceM).toBeCloseTo(distanceM, 4);
  });
});

describe('WLTC against UN GTR No. 15, Annex 1', () => {
  test('Class 3b: 1800 s, 23 266 m, 131.3 km/h (as published)', () => {
    const totals = totalsOf('wltc-class-3b');
    expect(totals.durationS).toBe(1800);
    expect(Math.abs(totals.distanceM - 23266)).toBeLessThanOrEqual(0.5);
    expect(totals.maximumSpeedKmh).toBe(131.3);
  });

  test('Class 3a: 1800 s, 23 194 m, 131.3 km/h (computed from the table)', () => {
    const totals = totalsOf('wltc-class-3a');
    expect(totals.durationS).toBe(1800);
    expect(Math.abs(totals.distanceM - 23194)).toBeLessThanOrEqual(0.5);
    expect(totals.maximumSpeedKmh).toBe(131.3);
  });

  test('Class 3b: published distances 3095, 4756, 7162, 8254 m and top speeds 56.5, 76.6, 97.4, 131.3 km/h of the phases', () => {
    const trace = builtInCycle('wltc-class-3b');
    const cycle = prepareCycle(trace);
    const published = [
      [3095, 56.5],
      [4756, 76.6],
      [7162, 97.4],
      [8254, 131.3],
    ] as const;
    published.forEach(([distanceM, topKmh], i) => {
      const from = WLTC_BOUNDARIES[i] as number;
      const to = WLTC_BOUNDARIES[i + 1] as number;
      expect(Math.abs(distanceBetween(cycle, from, to) - distanceM)).toBeLessThanOrEqual(0.5);
      expect(Math.max(...Array.from(trace.speedKmh).slice(from, to + 1))).toBe(topKmh);
    });
  });

  // The regulation prints the sum of the speeds of each phase; whole tenths make the comparison exact.
  test.each([
    ['wltc-class-3b', [111403, 171212, 257822, 297149], 837586],
    ['wltc-class-3a', [111403, 169957, 256460, 297149], 834969],
  ] as const)(
    '%s meets the published checksums of its phases and of the whole, digit for digit',
    (name, sums, total) => {
      const found = sums.map((_, i) =>
        sumOfTenths(name, WLTC_BOUNDARIES[i] as number, WLTC_BOUNDARIES[i + 1] as number),
      );
      expect(found).toEqual(sums);
      expect(sumOfTenths(name, -1, 1800)).toBe(total);
    },
  );
});

describe('The schedules of 40 CFR', () => {
  const milesOf = (m: number): number => m / 1000 / KM_PER_MILE;

  test.each([
    // Appendix I(a) to Part 86; EPA publishes 7.45 mi and 19.59 mph.
    ['udds', 1369, 7.45, 56.7, 19.59, 0.01],
    // Appendix I to Part 600; EPA publishes 10.26 mi and 48.3 mph.
    ['hwfet', 765, 10.26, 59.9, 48.3, 0.04],
  ] as const)(
    '%s: %i s, %f mi, at most %f mph, on average %f mph',
    (name, seconds, miles, top, mean, tolerance) => {
      const totals = totalsOf(name);
      expect(totals.durationS).toBe(seconds);
      expect(Math.abs(milesOf(totals.distanceM) - miles)).toBeLessThanOrEqual(tolerance);
      expect(totals.maximumSpeedKmh / KM_PER_MILE).toBeCloseTo(top, 10);
      expect(Math.abs(totals.meanSpeedKmh / KM_PER_MILE - mean)).toBeLessThanOrEqual(tolerance);
    },
  );

  test('US06 (Part 86, Appendix I(g)): 600 s of table, 8.01 mi, 80.3 mph; EPA counts 596 s of them for its 48.37 mph (memory)', () => {
    const totals = totalsOf('us06');
    expect(totals.durationS).toBe(600);
    expect(milesOf(totals.distanceM)).toBeCloseTo(8.01, 2);
    expect(totals.maximumSpeedKmh / KM_PER_MILE).toBeCloseTo(80.3, 10);
    expect((milesOf(totals.distanceM) * 3600) / 596).toBeCloseTo(48.37, 2);
  });

  test('The transient phase of the UDDS is the first 505 s and 3.59 mi, ending at rest (memory: FTP bag 1)', () => {
    const trace = builtInCycle('udds');
    expect(milesOf(distanceBetween(prepareCycle(trace), 0, 505))).toBeCloseTo(3.59, 2);
    expect(trace.speedKmh[505]).toBe(0);
  });

  test('Printed tenths of mph are converted without rounding', () => {
    expect(builtInCycle('udds').speedKmh[240]).toBe((567 / 10) * 1.609344);
  });
});

describe('NEDC against UN R83', () => {
  const seconds = (operations: readonly Operation[], activity?: Activity): number =>
    operations.reduce(
      (sum, [what, time]) => sum + (activity === undefined || what === activity ? time : 0),
      0,
    );

  // The breakdown by phases that the regulation prints for the elementary urban cycle.
  test.each([
    ['idle', 60],
    ['deceleration, clutch disengaged', 9],
    ['gear change', 8],
    ['acceleration', 36],
    ['steady speed', 57],
    ['deceleration', 25],
  ] as const)('The urban cycle has the published time of %s: %i s', (activity, time) => {
    expect(seconds(URBAN_OPERATIONS, activity)).toBe(time);
  });

  test('The urban cycle takes 195 s and the extra-urban cycle 400 s, as published', () => {
    expect(seconds(URBAN_OPERATIONS)).toBe(195);
    expect(seconds(EXTRA_URBAN_OPERATIONS)).toBe(400);
  });

  test('Straight lines give 1014.58 m for the urban cycle, where the regulation declares 1.013 km', () => {
    const { distanceM } = prepareCycle(traceOfOperations(URBAN_OPERATIONS));
    expect(Math.abs(distanceM - 1014.58)).toBeLessThanOrEqual(0.05);
    expect(Math.abs(distanceM - 1013)).toBeLessThan(2);
  });

  test('Straight lines give 11 013.19 m in 1180 s, 6954.86 m of them extra-urban (declared: 4 × 1013 + 6955 = 11 007 m)', () => {
    const cycle = prepareCycle(builtInCycle('nedc'));
    expect(cycle.durationS).toBe(1180);
    expect(Math.abs(cycle.distanceM - 11013.19)).toBeLessThanOrEqual(0.05);
    const extraUrban = prepareCycle(traceOfOperations(EXTRA_URBAN_OPERATIONS)).distanceM;
    expect(Math.abs(extraUrban - 6954.86)).toBeLessThanOrEqual(0.05);
    expect(Math.abs(4 * 1013 + extraUrban - 11007)).toBeLessThan(1);
  });
});
