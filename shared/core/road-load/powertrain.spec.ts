import { constantSpeedCycle, prepareCycle } from '../cycles/cycle';
import { type Refused } from '../refusal';
import { cycleEnergy } from './cycle-energy';
import {
  combustionConsumption,
  electricConsumption,
  engineOnTimeS,
  recoverableEnergyJ,
  type CombustionPowertrain,
  type Demand,
  type ElectricPowertrain,
  type Fuel,
} from './powertrain';
import { evaluatePowertrain, powertrainOnCycle, type PowertrainInput } from './powertrain-operation';

const ELECTRIC: ElectricPowertrain = {
  driveEfficiency: 0.8,
  regenerationEfficiency: 0.5,
  regenerationPowerLimitW: 20000,
  auxiliaryPowerW: 400,
  chargingEfficiency: 0.9,
  usableEnergyKWh: 60,
};
// JRC default fuel properties, read in the published text.
const PETROL: Fuel = { heatingValueJPerKg: 43.2e6, densityKgPerL: 0.745, co2KgPerKg: 3.17 };
const DIESEL: Fuel = { heatingValueJPerKg: 43.1e6, densityKgPerL: 0.832, co2KgPerKg: 3.16 };
const COMBUSTION: CombustionPowertrain = {
  driveEfficiency: 0.9,
  willansSlopeEfficiency: 0.4,
  zeroOutputPowerW: 5000,
  overrunCut: true,
  stopStart: true,
  fuel: PETROL,
};

/** Stand 2 s, gain 36 km/h in 4 s, keep it for 5 s, brake to rest in 2 s, stand 3 s. */
const DEMAND: Demand = {
  cycle: prepareCycle({ timeS: [0, 2, 6, 11, 13, 16], speedKmh: [0, 0, 36, 36, 0, 0] }),
  load: { f0N: 100, f1NPerKmh: 0, f2NPerKmh2: 0 },
  massKg: 1000,
  rotatingFactor: 1,
};
const atConstantSpeed: Demand = { ...DEMAND, cycle: prepareCycle(constantSpeedCycle(36, 100)) };

describe('Recovered braking energy', () => {
  // Braking: 1000 kg at −5 m/s², less 100 N of resistance, over 10 m.
  test('Under the power limit all of it counts', () => {
    expect(recoverableEnergyJ(DEMAND, 1e6)).toBeCloseTo(4900 * 10, 9);
  });

  test('Beyond the limit the step counts with the limit times its time', () => {
    expect(recoverableEnergyJ(DEMAND, 20000)).toBe(20000 * 2);
  });
});

describe('Electric', () => {
  test('Battery energy is drive, less recovery, plus auxiliaries over the whole time', () => {
    const wheelJ = cycleEnergy(DEMAND.cycle, DEMAND.load, 1000, 1).wheelEnergyJ;
    const batteryJ = wheelJ / 0.8 - 0.5 * 40000 + 400 * 16;
    const { batteryEnergyWhPerKm, plugEnergyWhPerKm, rangeKm } = electricConsumption(DEMAND, ELECTRIC);
    expect(batteryEnergyWhPerKm).toBeCloseTo(batteryJ / 3.6 / DEMAND.cycle.distanceM, 10);
    expect(plugEnergyWhPerKm).toBeCloseTo(batteryEnergyWhPerKm / 0.9, 10);
    expect(rangeKm).toBeCloseTo(60000 / batteryEnergyWhPerKm, 10);
  });

  test('Where more would come back than goes out there is no range', () => {
    const downhill: Demand = { ...DEMAND, load: { f0N: -500, f1NPerKmh: 0, f2NPerKmh2: 0 } };
    const electric = {
      ...ELECTRIC,
      auxiliaryPowerW: 0,
      regenerationEfficiency: 1,
      regenerationPowerLimitW: 1e6,
    };
    expect(() => electricConsumption(downhill, electric)).toThrow(
      expect.objectContaining({ code: 'not-positive', where: 'electric' }) as Refused,
    );
  });
});

describe('Combustion', () => {
  test.each([
    [false, false, 16],
    [true, false, 14],
    [false, true, 11],
    [true, true, 9],
  ])('With overrun cut %s and stop–start %s the engine burns for %i s', (overrunCut, stopStart, seconds) => {
    expect(engineOnTimeS(DEMAND, overrunCut, stopStart)).toBe(seconds);
    expect(combustionConsumption(DEMAND, { ...COMBUSTION, overrunCut, stopStart }).engineOnS).toBe(seconds);
  });

  test('The Willans line adds the zero-output power over e for as long as the engine burns', () => {
    // 100 N over 1 km at 10 m/s: 1e5 J at the wheel in 100 s.
    const { fuelEnergyMjPerKm } = combustionConsumption(atConstantSpeed, COMBUSTION);
    expect(fuelEnergyMjPerKm).toBeCloseTo((1e5 / (0.4 * 0.9) + (5000 / 0.4) * 100) / 1e6, 12);
  });

  test.each([
    ['petrol', PETROL, 2.36165, 32.184],
    ['diesel', DIESEL, 2.62912, 35.859],
  ])(
    'A litre of %s by the JRC values is %#.5f kg of CO2 and %f MJ (computed products)',
    (_, fuel, kgPerL, mjPerL) => {
      const { fuelEnergyMjPerKm, litresPer100Km, co2GPerKm } = combustionConsumption(atConstantSpeed, {
        ...COMBUSTION,
        fuel,
      });
      expect(Math.abs(co2GPerKm / 10 / litresPer100Km / kgPerL - 1)).toBeLessThanOrEqual(1e-4);
      expect(Math.abs((fuelEnergyMjPerKm * 100) / litresPer100Km / mjPerL - 1)).toBeLessThanOrEqual(1e-4);
    },
  );

  // US EIA, frequently asked questions (read); EPA and NHTSA, 75 FR 25324 (memory). US gallon 3.785411784 L, pound 0.45359237 kg.
  test.each([
    ['petrol', PETROL, 19.64, 2.3534, 8887, 2.3477],
    ['diesel', DIESEL, 22.38, 2.6817, 10180, 2.68927],
  ])(
    'CO2 of a litre of %s lies within 2.5 %% of what EIA and EPA publish per gallon',
    (_, fuel, eiaLb, eia, epaG, epa) => {
      expect(Math.abs((eiaLb * 0.45359237) / 3.785411784 / eia - 1)).toBeLessThanOrEqual(1e-4);
      expect(Math.abs(epaG / 1000 / 3.785411784 / epa - 1)).toBeLessThanOrEqual(1e-4);
      const { litresPer100Km, co2GPerKm } = combustionConsumption(atConstantSpeed, { ...COMBUSTION, fuel });
      const kgPerL = co2GPerKm / 10 / litresPer100Km;
      expect(Math.abs(kgPerL / eia - 1)).toBeLessThan(0.025);
      expect(Math.abs(kgPerL / epa - 1)).toBeLessThan(0.025);
    },
  );
});

describe('The operation powertrain', () => {
  const INPUT: PowertrainInput = {
    airDensityKgM3: 1.189,
    commonAreaM2: 2.2,
    variant: { massKg: 1500, rollingResistance: 0.009 },
    dragAreaM2: 0.62,
    cycle: { timeS: [0, 5, 40, 46, 50], speedKmh: [0, 50, 50, 0, 0] },
  };
  const none = () => undefined;

  test('Without a powertrain the wheel energy and its exchange rate are all there is', () => {
    const output = evaluatePowertrain(INPUT, none);
    expect(Object.keys(output).sort()).toEqual([
      'exchangeRatesPerCount',
      'exchangeRatesPerM2',
      'f0N',
      'f1NPerKmh',
      'f2NPerKmh2',
      'wheelEnergyJ',
      'wheelEnergyWhPerKm',
    ]);
    expect(Object.keys(output.exchangeRatesPerM2)).toEqual(['wheelEnergyWhPerKm']);
  });

  test('With both powertrains each has its figures, and the engine time has no rate', () => {
    const output = evaluatePowertrain({ ...INPUT, electric: ELECTRIC, combustion: COMBUSTION }, none);
    expect(Object.keys(output.exchangeRatesPerM2).sort()).toEqual([
      'batteryEnergyWhPerKm',
      'co2GPerKm',
      'fuelEnergyMjPerKm',
      'litresPer100Km',
      'plugEnergyWhPerKm',
      'rangeKm',
      'wheelEnergyWhPerKm',
    ]);
    expect(output.engineOnS).toBe(40);
    expect(output.exchangeRatesPerM2.rangeKm).toBeLessThan(0);
    expect(output.exchangeRatesPerM2.co2GPerKm).toBeGreaterThan(0);
  });

  test('A count is 0.001 of the common area', () => {
    const { exchangeRatesPerM2, exchangeRatesPerCount } = evaluatePowertrain(
      { ...INPUT, electric: ELECTRIC },
      none,
    );
    for (const [name, perM2] of Object.entries(exchangeRatesPerM2)) {
      expect(exchangeRatesPerCount).toHaveProperty(name, expect.closeTo(perM2 * 0.0022, 10));
    }
  });

  test('A rate is the central difference of the whole calculation', () => {
    const cycle = prepareCycle({ timeS: [0, 5, 40, 46, 50], speedKmh: [0, 50, 50, 0, 0] });
    const given = { ...INPUT, electric: ELECTRIC };
    const rangeAt = (dragAreaM2: number) => powertrainOnCycle({ ...given, dragAreaM2 }, cycle).rangeKm ?? NaN;
    expect(powertrainOnCycle(given, cycle).exchangeRatesPerM2.rangeKm).toBeCloseTo(
      (rangeAt(0.621) - rangeAt(0.619)) / 0.002,
      6,
    );
  });

  test.each([
    ['commonAreaM2', { commonAreaM2: 0 }],
    ['dragAreaM2', { dragAreaM2: -0.6 }],
    ['variant.massKg', { variant: { massKg: 0, rollingResistance: 0.009 } }],
    ['electric.driveEfficiency', { electric: { ...ELECTRIC, driveEfficiency: 0 } }],
    ['electric.chargingEfficiency', { electric: { ...ELECTRIC, chargingEfficiency: 0 } }],
    ['electric.usableEnergyKWh', { electric: { ...ELECTRIC, usableEnergyKWh: 0 } }],
    ['combustion.driveEfficiency', { combustion: { ...COMBUSTION, driveEfficiency: 0 } }],
    ['combustion.willansSlopeEfficiency', { combustion: { ...COMBUSTION, willansSlopeEfficiency: 0 } }],
    [
      'combustion.fuel.densityKgPerL',
      { combustion: { ...COMBUSTION, fuel: { ...PETROL, densityKgPerL: 0 } } },
    ],
    [
      'combustion.fuel.heatingValueJPerKg',
      { combustion: { ...COMBUSTION, fuel: { ...PETROL, heatingValueJPerKg: 0 } } },
    ],
    [
      'variant.roadLoadReference.massKg',
      {
        variant: {
          massKg: 1500,
          roadLoadReference: {
            f0N: 1,
            f1NPerKmh: 0,
            f2NPerKmh2: 0,
            massKg: 0,
            dragAreaM2: 1,
            airDensityKgM3: 1,
          },
        },
      },
    ],
  ])('It refuses a %s that is not above 0', (where, wrong) => {
    expect(() => evaluatePowertrain({ ...INPUT, ...wrong }, none)).toThrow(
      expect.objectContaining({ code: 'not-positive', where }) as Refused,
    );
  });

  test('A vehicle without any way to a road load is refused', () => {
    expect(() => evaluatePowertrain({ ...INPUT, variant: { massKg: 1500 } }, none)).toThrow(
      expect.objectContaining({ code: 'missing-input' }) as Refused,
    );
  });
});
