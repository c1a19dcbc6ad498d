import { Refused } from '../refusal';
import { evaluatePlan } from './plan';
import type { PlanInput } from './planning-setting';
import { temperatureForReynoldsRatio } from './ways-out';

/** One-fifth of a full-size 120 km/h in sea-level air, in a tunnel of no stated maximum speed. */
const oneFifth: PlanInput = {
  scale: 0.2,
  characteristicLengthM: 4.5,
  referenceSpeedKmh: 120,
  referenceAir: { state: 'iso-2533-sea-level' },
  tunnelAir: { temperatureC: 15, pressurePa: 101325 },
  facility: { kind: 'closed', areaM2: 8.2 },
  frontalAreaM2: 2.27,
  dragCoefficient: 0.285,
};

const refusedWith = (changes: Partial<PlanInput>): { code: string; where: string } => {
  try {
    evaluatePlan({ ...oneFifth, ...changes });
  } catch (error) {
    if (error instanceof Refused) return { code: error.code, where: error.where };
    throw error;
  }
  return { code: 'accepted', where: '' };
};

describe('A test plan', () => {
  const plan = evaluatePlan(oneFifth);

  test('asks one-fifth scale for 600 km/h and Mach 0.49, and refuses it', () => {
    expect(plan.requiredSpeedKmh).toBeCloseTo(600, 4);
    expect(plan.mach).toBeCloseTo(0.49, 3);
    expect(plan.machVerdict).toBe('refused');
  });

  test('says nothing of what is attainable where no maximum speed is stated', () => {
    expect(plan).not.toHaveProperty('attainableSpeedMs');
    expect(plan).not.toHaveProperty('withinFacilitySpeed');
  });

  test('goes out at the Mach limit by each way: scale, pressure or temperature', () => {
    const ways = plan.waysOut!;
    const byScale = evaluatePlan({ ...oneFifth, scale: ways.scaleAtMachLimit! });
    const byPressure = evaluatePlan({
      ...oneFifth,
      tunnelAir: { temperatureC: 15, pressurePa: ways.pressureAtMachLimitPa },
    });
    expect(byScale.mach).toBeCloseTo(0.3, 12);
    expect(byPressure.mach).toBeCloseTo(0.3, 12);
    // In air the same way by temperature: a plan whose limit is lower, so that the cold air stays within its range.
    const cooler = { ...oneFifth, scale: 0.31 };
    const kelvin = evaluatePlan(cooler).waysOut!.temperatureAtMachLimitK!;
    const byTemperature = evaluatePlan({
      ...cooler,
      tunnelAir: { temperatureC: kelvin - 273.15, pressurePa: 101325 },
    });
    expect(byTemperature.mach).toBeCloseTo(0.3, 12);
  });

  test('offers no scale above 1 and no gas below 100 K', () => {
    const ways = evaluatePlan({ ...oneFifth, scale: 0.2, targetReynolds: 4e7 }).waysOut!;
    expect(ways.scaleAtMachLimit).toBeNull();
    expect(ways.temperatureAtMachLimitK).toBeNull();
    expect(ways.pressureRatioAtMachLimit).toBeGreaterThan(6);
  });

  test('has no ways out where none is needed', () => {
    expect(evaluatePlan({ ...oneFifth, scale: 1 })).not.toHaveProperty('waysOut');
  });

  test('asks a pressurised quarter-scale model at the full-size speed for four atmospheres', () => {
    const quarter = { ...oneFifth, scale: 0.25, referenceSpeedKmh: 120 };
    const speedAt = (pressurePa: number) =>
      evaluatePlan({ ...quarter, tunnelAir: { temperatureC: 15, pressurePa } }).requiredSpeedKmh;
    expect(speedAt(4 * 101325)).toBeCloseTo(120, 4);
    expect(speedAt(101325) / speedAt(4 * 101325)).toBeCloseTo(4, 12);
  });

  test('carries the Reynolds number that a sweep accepts through to speed, Mach number and force', () => {
    const { accepted } = evaluatePlan({
      ...oneFifth,
      facility: { kind: 'closed', areaM2: 8.2, maximumSpeedKmh: 300 },
      acceptedReynolds: 4e6,
    });
    expect(accepted!.requiredSpeedMs / plan.requiredSpeedMs).toBeCloseTo(4e6 / plan.targetReynolds, 12);
    expect(accepted).toMatchObject({ reynolds: 4e6, machVerdict: 'passes', withinFacilitySpeed: true });
  });

  test('takes the organisation’s blockage limits where it has its own', () => {
    const limits = { blockageCaution: 0.005, blockageExcluded: 0.01, openJetLimit: 0.35 };
    expect(evaluatePlan({ ...oneFifth, blockageLimits: limits }).blockageVerdict).toBe('excluded');
    expect(plan.blockageVerdict).toBe('passes');
  });

  test.each([
    [{ scale: 0 }, 'scale-out-of-range', 'scale'],
    [{ scale: 1.2 }, 'scale-out-of-range', 'scale'],
    [{ scale: 1, frontalAreaM2: 9 }, 'model-larger-than-section', 'facility.areaM2'],
    [
      { tunnelAir: { temperatureC: 293, pressurePa: 101325 } },
      'temperature-out-of-range',
      'tunnelAir.temperatureC',
    ],
    [
      { tunnelAir: { temperatureC: 20, pressurePa: 1013.25 } },
      'pressure-out-of-range',
      'tunnelAir.pressurePa',
    ],
    [{ referenceSpeedKmh: 0 }, 'not-positive', 'referenceSpeedKmh'],
    [{ targetReynolds: -1 }, 'not-positive', 'targetReynolds'],
    [
      { facility: { kind: 'closed' as const, areaM2: 8.2, maximumSpeedKmh: 0 } },
      'not-positive',
      'facility.maximumSpeedKmh',
    ],
  ])('refuses %j as %s', (changes, code, where) => {
    expect(refusedWith(changes)).toEqual({ code, where });
  });
});

describe('A cooled gas', () => {
  // Ideal gas at equal M, p and L with Sutherland's nitrogen: ratios as computed apart from this code; Kilgore and Dress, Cryogenics
  // (1984), give “as much as a factor of 7” for cryogenic nitrogen tunnels.
  test.each([
    [100, 322, 5.052],
    [100, 300, 4.62],
    [77.4, 300, 6.887],
    [100, 288.15, 4.389],
  ])('nitrogen at %d K against %d K has %d times the Reynolds number', (cold, warm, ratio) => {
    expect(Math.abs(temperatureForReynoldsRatio(warm, ratio, 'nitrogen') / cold - 1)).toBeLessThan(3e-4);
  });

  test('needs no cooling for a ratio of 1, and less in each of two steps than in one', () => {
    expect(temperatureForReynoldsRatio(288.15, 1, 'air')).toBeCloseTo(288.15, 10);
    const step = temperatureForReynoldsRatio(288.15, Math.sqrt(2), 'air');
    expect(temperatureForReynoldsRatio(step, Math.sqrt(2), 'air')).toBeCloseTo(
      temperatureForReynoldsRatio(288.15, 2, 'air'),
      9,
    );
  });
});
