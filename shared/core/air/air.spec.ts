import { HEAT_CAPACITY_RATIO_AIR, SPECIFIC_GAS_CONSTANT_AIR } from '../constants';
import { Refused } from '../refusal';
import { airOf } from './air';
import { dryAirDensity, dynamicViscosity, speedOfSound } from './gas-properties';
import { moistAirDensity, vapourFraction } from './moist-air';

const within = (found: number, expected: number, allowed: number): void =>
  expect(Math.abs(found - expected)).toBeLessThanOrEqual(allowed);

describe('The ISO 2533 sea-level state', () => {
  const air = airOf({ state: 'iso-2533-sea-level' });

  it('has 1.225 kg/m³, which p/(R·T) gives (ISO 2533, ICAO Doc 7488; computed)', () => {
    expect(air.densityKgM3).toBe(1.225);
    within(dryAirDensity(288.15, 101325), 1.225, 5e-5);
    expect(SPECIFIC_GAS_CONSTANT_AIR).toBe(287.05287);
  });

  it('has 1.7894e-5 Pa·s, 1.4607e-5 m²/s and 340.294 m/s (ISO 2533; computed)', () => {
    within(air.dynamicViscosityPaS, 1.7894e-5, 5e-10);
    within(air.kinematicViscosityM2S, 1.4607e-5, 5e-10);
    within(air.speedOfSoundMs, 340.294, 1e-3);
    within(speedOfSound(288.15), 340.294, 1e-3);
    expect(HEAT_CAPACITY_RATIO_AIR).toBe(1.4);
  });
});

describe("Sutherland's viscosity", () => {
  it.each([
    [0, 1.71608e-5],
    [15, 1.78938e-5],
    [20, 1.81341e-5],
    [25, 1.83723e-5],
  ])('at %d °C is %d Pa·s (constants of ISO 2533; computed)', (t, mu) => {
    within(dynamicViscosity(t + 273.15), mu, 1e-4 * mu);
  });

  it('is 1.3 % below the older constants with S = 120 K (computed)', () => {
    within(1.8369e-5 / dynamicViscosity(293.15) - 1, 0.013, 0.0005);
  });
});

describe('The reference states of road load', () => {
  it('UN GTR No. 15: 100 kPa, 293 K, 1.189 kg/m³ as printed; p/(R·T) gives 1.18897 (paragraph 3.2.9)', () => {
    expect(airOf({ state: 'un-gtr-15' })).toMatchObject({ temperatureK: 293, densityKgM3: 1.189 });
    within(dryAirDensity(293, 100000), 1.189, 5e-4);
  });

  it('SAE J2263: 98.21 kPa, 20 °C, 1.1671 kg/m³ computed (40 CFR 1066.305)', () => {
    within(airOf({ state: 'sae-j2263' }).densityKgM3, 1.1671, 2e-4);
  });

  it('40 CFR 1066.310 prints 1.17 kg/m³ for the same state', () => {
    const air = airOf({ state: 'cfr-1066-as-printed' });
    expect(air.densityKgM3).toBe(1.17);
    within(air.densityKgM3, airOf({ state: 'sae-j2263' }).densityKgM3, 0.005);
  });

  it('differ by 1.84 % between SAE J2263 and UN GTR No. 15 (computed)', () => {
    within(airOf({ state: 'sae-j2263' }).densityKgM3 / dryAirDensity(293, 100000), 0.981597, 2e-5);
  });

  it('take in the air of the UN R83 family, 100 kPa and 293.2 K, within its 7.5 % (text)', () => {
    const r83 = dryAirDensity(293.2, 100000);
    within(airOf({ state: 'un-gtr-15' }).densityKgM3 / r83, 1, 0.075);
  });
});

describe('Moist air by CIPM-2007', () => {
  it.each([
    [10, 97325.34, 0.4, 1.19569, 2e-5, 'Jones & Schoonover, Handbook of Mass Measurement, p. 205'],
    [40, 101325, 0.4, 1.115, 1e-4, 'the same source prints 1.11497 with the older argon value'],
    [20, 101325, 0.5, 1.199314, 2.4e-5, 'Picard et al., Metrologia 45 (2008) 149; computed apart'],
    [20, 100000, 0.5, 1.183557, 2.4e-5, 'computed apart'],
    [25, 101325, 0.5, 1.177315, 2.4e-5, 'computed apart'],
    [15, 101325, 0, 1.225521, 2.4e-5, 'computed apart'],
    [0, 101325, 0.5, 1.291578, 2.4e-5, 'computed apart'],
    [25, 101325, 0.4, 1.1787, 1e-4, 'OIML R111, approximate formula'],
    [30, 101325, 0.8, 1.15001, 5.8e-5, 'computed apart: humid air is about 1.25 % lighter'],
    [30, 101325, 0, 1.164716, 5.8e-5, 'computed apart'],
  ])('at %d °C, %d Pa, humidity %d is %d kg/m³ within %d: %s', (t, p, h, rho, allowed) => {
    within(moistAirDensity(t, p, h), rho, allowed);
  });

  it('lies 0.04 % above the ideal mixture at 20 °C and 50 % (computed)', () => {
    within(1.19886 / moistAirDensity(20, 101325, 0.5) - 1, -0.00038, 1e-5);
  });

  it.each([
    [30, 95461, 0.02, 1.08411986348219],
    [20, 101325, 1e-7, 1.2041518025],
    [20, 101325, 0.007261737207462574, 1.1988979667],
    [30, 101325, 0.02157333991480702, 1.1496726668],
  ])(
    'at %d °C, %d Pa and humidity ratio %d is within 0.05 %% of the ideal mixture %d (ASHRAE Fundamentals, psychrolib 1.1.1)',
    (t, p, ratio, rho) => {
      const fraction = ratio / (ratio + 0.621945);
      const humidity = fraction / vapourFraction(t, p, 1);
      within(moistAirDensity(t, p, humidity) / rho, 1, 5e-4);
    },
  );
});

describe('Air as it is given', () => {
  const moist = { temperatureC: 20, pressurePa: 101325, relativeHumidity: 0.5 };
  const codeOf = (input: object): string | undefined => {
    try {
      airOf(input);
      return undefined;
    } catch (error) {
      return error instanceof Refused ? error.code : String(error);
    }
  };

  it.each([
    [{ ...moist, temperatureC: -40.1 }, 'temperature-out-of-range'],
    [{ ...moist, temperatureC: 60.1 }, 'temperature-out-of-range'],
    [{ ...moist, pressurePa: 29999 }, 'pressure-out-of-range'],
    [{ ...moist, pressurePa: 1013.25 }, 'pressure-out-of-range'],
    [{ ...moist, relativeHumidity: 50 }, 'humidity-out-of-range'],
    [{ ...moist, relativeHumidity: null }, 'missing-input'],
    [{}, 'missing-input'],
    [{ state: 'isa' }, 'unknown-air-state'],
    [{ state: 'toString' }, 'unknown-air-state'],
  ])('%j is refused: %s', (input, code) => {
    expect(codeOf(input)).toBe(code);
  });

  it('may reach the limits themselves', () => {
    expect(codeOf({ temperatureC: -40, pressurePa: 3e4, relativeHumidity: 0 })).toBeUndefined();
    expect(codeOf({ temperatureC: 60, pressurePa: 1e6, relativeHumidity: 1 })).toBeUndefined();
  });

  it('says where CIPM-2007 is used outside its range, and only there', () => {
    expect(airOf({ ...moist, temperatureC: 15 }).notes).toEqual([]);
    expect(airOf({ ...moist, temperatureC: 14.9 }).notes).toEqual(['outside-cipm-2007-range']);
    expect(airOf({ ...moist, pressurePa: 111000 }).notes).toEqual(['outside-cipm-2007-range']);
    expect(airOf({ ...moist, state: 'custom' })).toEqual(airOf(moist));
  });
});
