import fc from 'fast-check';
import { constantSpeedCycle, prepareCycle, type CycleTrace } from '../cycles/cycle';
import { type Refused } from '../refusal';
import { cycleEnergy, whPerKm } from './cycle-energy';
import { evaluateCycleEnergy } from './cycle-energy-operation';
import { energiesOnCycle } from './energies-on-cycle';
import { roadLoadOf } from './road-load';

const LOAD = { f0N: 120, f1NPerKmh: 0.8, f2NPerKmh2: 0.03 };

/** Traces at uneven steps that move at least once. */
const anyTrace: fc.Arbitrary<CycleTrace> = fc
  .array(
    fc.tuple(fc.double({ min: 0.2, max: 5, noNaN: true }), fc.double({ min: 0, max: 160, noNaN: true })),
    {
      minLength: 3,
      maxLength: 60,
    },
  )
  .filter((rows) => rows.some(([, speed]) => speed > 1))
  .map((rows) => {
    let time = 0;
    return { timeS: rows.map(([step]) => (time += step)), speedKmh: rows.map(([, speed]) => speed) };
  });
const anyDragArea = fc.double({ min: 0.3, max: 1.2, noNaN: true });
const anyMass = fc.double({ min: 700, max: 3500, noNaN: true });

const energyAt = (trace: CycleTrace, dragAreaM2: number, massKg: number) =>
  cycleEnergy(
    prepareCycle(trace),
    roadLoadOf({ massKg, rollingResistance: 0.009 }, dragAreaM2, 1.189),
    massKg,
  );

describe('One step', () => {
  test('50 to 53.6 km/h in 1 s: F 1786.9372 N, E 25 712.0408 J (computed; GTR 15 Annex 7 form from memory)', () => {
    const cycle = prepareCycle({ timeS: [0, 1], speedKmh: [50, 53.6] });
    const { wheelEnergyJ, distanceM } = cycleEnergy(cycle, LOAD, 1500, 1.03);
    expect(Math.abs(wheelEnergyJ / distanceM / 1786.9372 - 1)).toBeLessThanOrEqual(1e-8);
    expect(Math.abs(wheelEnergyJ / 25712.0408 - 1)).toBeLessThanOrEqual(1e-8);
  });

  test('Braking is counted apart, as a positive figure', () => {
    const cycle = prepareCycle({ timeS: [0, 1], speedKmh: [53.6, 50] });
    const { wheelEnergyJ, brakingEnergyJ, distanceM } = cycleEnergy(cycle, LOAD, 1500, 1.03);
    expect(wheelEnergyJ).toBe(0);
    const force = 120 + 0.8 * 51.8 + 0.03 * 51.8 ** 2 - 1.03 * 1500;
    expect(brakingEnergyJ).toBeCloseTo(-force * distanceM, 8);
  });

  test('The rotating factor is 1.03 where none is given', () => {
    const cycle = prepareCycle({ timeS: [0, 1], speedKmh: [50, 53.6] });
    expect(cycleEnergy(cycle, LOAD, 1500)).toEqual(cycleEnergy(cycle, LOAD, 1500, 1.03));
  });
});

test('At constant speed the energy is the resistance times the distance', () => {
  const cycle = prepareCycle(constantSpeedCycle(115, 840));
  const { wheelEnergyJ, brakingEnergyJ, distanceM } = cycleEnergy(cycle, LOAD, 1655);
  expect(wheelEnergyJ).toBeCloseTo((120 + 0.8 * 115 + 0.03 * 115 ** 2) * distanceM, 6);
  expect(brakingEnergyJ).toBe(0);
});

test('1 kWh over 1 km is 1000 Wh/km', () => {
  expect(whPerKm(3.6e6, 1000)).toBe(1000);
});

describe('Whatever the trace', () => {
  test('Energy grows with the drag area', () => {
    fc.assert(
      fc.property(anyTrace, anyDragArea, anyMass, (trace, area, mass) => {
        const less = energyAt(trace, area, mass);
        const more = energyAt(trace, area * 1.02, mass);
        expect(more.wheelEnergyJ).toBeGreaterThanOrEqual(less.wheelEnergyJ);
        expect(more.brakingEnergyJ).toBeLessThanOrEqual(less.brakingEnergyJ);
        expect(more.wheelEnergyJ - more.brakingEnergyJ).toBeGreaterThan(
          less.wheelEnergyJ - less.brakingEnergyJ,
        );
      }),
    );
  });

  test('Energy grows with the mass where the trace starts from rest', () => {
    fc.assert(
      fc.property(anyTrace, anyDragArea, anyMass, ({ timeS, speedKmh }, area, mass) => {
        const trace = { timeS: [0, ...Array.from(timeS)], speedKmh: [0, ...Array.from(speedKmh)] };
        expect(energyAt(trace, area, mass * 1.05).wheelEnergyJ).toBeGreaterThan(
          energyAt(trace, area, mass).wheelEnergyJ,
        );
      }),
    );
  });

  test('A step at even speed may be split anywhere', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 5, max: 150, noNaN: true }),
        fc.double({ min: 0.05, max: 0.95, noNaN: true }),
        (speed, share) => {
          const whole = cycleEnergy(prepareCycle({ timeS: [0, 8], speedKmh: [speed, speed] }), LOAD, 1500);
          const split = cycleEnergy(
            prepareCycle({ timeS: [0, 8 * share, 8], speedKmh: [speed, speed, speed] }),
            LOAD,
            1500,
          );
          expect(split.wheelEnergyJ / whole.wheelEnergyJ).toBeCloseTo(1, 12);
        },
      ),
    );
  });

  test('An accelerating step may be split where the resistance does not depend on speed', () => {
    fc.assert(
      fc.property(fc.double({ min: 0.05, max: 0.95, noNaN: true }), (share) => {
        const even = { f0N: 150, f1NPerKmh: 0, f2NPerKmh2: 0 };
        const whole = cycleEnergy(prepareCycle({ timeS: [0, 5], speedKmh: [20, 60] }), even, 1500);
        const split = cycleEnergy(
          prepareCycle({ timeS: [0, 5 * share, 5], speedKmh: [20, 20 + 40 * share, 60] }),
          even,
          1500,
        );
        expect(split.wheelEnergyJ / whole.wheelEnergyJ).toBeCloseTo(1, 12);
      }),
    );
  });
});

describe('Many vehicles on one cycle', () => {
  const anyFleet = fc.array(fc.tuple(anyDragArea, anyMass), { minLength: 1, maxLength: 7 });

  test('They have the energies that each has alone, to the last bit, odd numbers of them too', () => {
    fc.assert(
      fc.property(anyTrace, anyFleet, (trace, fleet) => {
        const cycle = prepareCycle(trace);
        const vehicles = fleet.map(([area, massKg]) => ({
          load: roadLoadOf({ massKg, rollingResistance: 0.009 }, area, 1.189),
          massKg,
        }));
        const together = energiesOnCycle(cycle, vehicles, 1.189);
        const alone = vehicles.map(({ load, massKg }) => cycleEnergy(cycle, load, massKg));
        expect(Array.from(together.wheelEnergyJ)).toEqual(alone.map((one) => one.wheelEnergyJ));
        expect(Array.from(together.brakingEnergyJ)).toEqual(alone.map((one) => one.brakingEnergyJ));
        expect(together.distanceM).toBe(cycle.distanceM);
      }),
    );
  });

  test('The exchange rate is the central difference of the whole calculation at ±0.001 m²', () => {
    fc.assert(
      fc.property(anyTrace, anyFleet, (trace, fleet) => {
        const cycle = prepareCycle(trace);
        const vehicles = fleet.map(([area, massKg]) => ({
          load: roadLoadOf({ massKg, rollingResistance: 0.009 }, area, 1.189),
          massKg,
        }));
        const { exchangeRateJPerM2 } = energiesOnCycle(cycle, vehicles, 1.189);
        fleet.forEach(([area, massKg], i) => {
          const above = energyAt(trace, area + 0.001, massKg).wheelEnergyJ;
          const below = energyAt(trace, area - 0.001, massKg).wheelEnergyJ;
          const difference = (above - below) / 0.002;
          // Subtracting two energies leaves their rounding in the difference.
          const allowed = 1e-9 * Math.abs(difference) + 1e-12 * above;
          expect(Math.abs((exchangeRateJPerM2[i] as number) - difference)).toBeLessThanOrEqual(allowed);
        });
      }),
    );
  });

  test('A step whose sign turns within ±0.001 m² counts by the share of it that is above 0', () => {
    const cycle = prepareCycle(constantSpeedCycle(100, 36));
    const b = 0.5 * 1.2 * 0.001 * (100 / 3.6) ** 2 * cycle.distanceM;
    for (const share of [-1.5, -0.5, 0, 0.5, 1.5]) {
      const f0N = (share * b) / cycle.distanceM;
      const vehicle = { load: { f0N, f1NPerKmh: 0, f2NPerKmh2: 0 }, massKg: 1000 };
      const [rate] = energiesOnCycle(cycle, [vehicle], 1.2).exchangeRateJPerM2;
      const expected = (Math.max(share * b + b, 0) - Math.max(share * b - b, 0)) / 0.002;
      expect(rate).toBeCloseTo(expected, 3);
    }
  });

  test('No vehicles have no energies', () => {
    const cycle = prepareCycle(constantSpeedCycle(100, 36));
    expect(energiesOnCycle(cycle, [], 1.2).wheelEnergyJ).toHaveLength(0);
  });
});

describe('The operation cycle-energy', () => {
  const none = () => undefined;

  test('It adds the duration and the energy per kilometre', () => {
    const input = { ...LOAD, massKg: 1500, cycle: { constantSpeedKmh: 100, durationS: 36 } };
    const output = evaluateCycleEnergy(input, none);
    expect(output.durationS).toBe(36);
    expect(output.distanceM).toBeCloseTo(1000, 10);
    expect(output.wheelEnergyWhPerKm).toBeCloseTo(output.wheelEnergyJ / 3600, 10);
  });

  test('A rotating factor of null is none given', () => {
    const input = { ...LOAD, massKg: 1500, cycle: { timeS: [0, 1, 2], speedKmh: [0, 5, 9] } };
    expect(evaluateCycleEnergy({ ...input, rotatingFactor: null }, none)).toEqual(
      evaluateCycleEnergy(input, none),
    );
  });

  test.each([0, -1500])('A mass of %i kg is refused', (massKg) => {
    const input = { ...LOAD, massKg, cycle: { constantSpeedKmh: 100, durationS: 36 } };
    expect(() => evaluateCycleEnergy(input, none)).toThrow(
      expect.objectContaining({ code: 'not-positive', where: 'massKg' }) as Refused,
    );
  });
});
