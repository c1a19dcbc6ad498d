import { AIR_LIMITS, CELSIUS_ZERO_K, CIPM_2007_RANGE, REFERENCE_AIR } from '../constants';
import { refuse } from '../refusal';
import type { AirInput } from './air-input';
import { dryAirDensity, dynamicViscosity, speedOfSound } from './gas-properties';
import { moistAirDensity } from './moist-air';

export type AirNote = 'outside-cipm-2007-range';

/** Air as the method uses it, and the output of the operation `air`. */
export interface Air {
  readonly temperatureK: number;
  readonly densityKgM3: number;
  readonly dynamicViscosityPaS: number;
  readonly kinematicViscosityM2S: number;
  readonly speedOfSoundMs: number;
  readonly notes: readonly AirNote[];
}

type NamedState = keyof typeof REFERENCE_AIR;

const isNamedState = (state: string): state is NamedState => Object.hasOwn(REFERENCE_AIR, state);

function airWith(temperatureK: number, densityKgM3: number, notes: readonly AirNote[]): Air {
  const dynamicViscosityPaS = dynamicViscosity(temperatureK);
  return {
    temperatureK,
    densityKgM3,
    dynamicViscosityPaS,
    kinematicViscosityM2S: dynamicViscosityPaS / densityKgM3,
    speedOfSoundMs: speedOfSound(temperatureK),
    notes,
  };
}

function namedAir(state: NamedState): Air {
  const { temperatureK, pressurePa, densityKgM3 } = REFERENCE_AIR[state];
  return airWith(temperatureK, densityKgM3 ?? dryAirDensity(temperatureK, pressurePa), []);
}

interface Range {
  readonly min: number;
  readonly max: number;
  readonly code: string;
  readonly words: string;
}

function stated(value: number | null | undefined, where: string, range: Range): number {
  if (value == null) refuse('missing-input', where, `${where} is missing; without it there is no density.`);
  if (!(value >= range.min && value <= range.max)) {
    refuse(range.code, where, `${value} is outside ${range.words}: probably mistyped.`);
  }
  return value;
}

/** A temperature in °C that air can have. @throws {Refused} missing-input, temperature-out-of-range (−40 to 60 °C) */
export function statedTemperature(temperatureC: number | null | undefined, where: string): number {
  return stated(temperatureC, where, {
    min: AIR_LIMITS.minC,
    max: AIR_LIMITS.maxC,
    code: 'temperature-out-of-range',
    words: '−40 to 60 °C',
  });
}

/** A static pressure in Pa that air can have. @throws {Refused} missing-input, pressure-out-of-range (30 to 1000 kPa) */
export function statedPressure(pressurePa: number | null | undefined, where: string): number {
  return stated(pressurePa, where, {
    min: AIR_LIMITS.minPa,
    max: AIR_LIMITS.maxPa,
    code: 'pressure-out-of-range',
    words: '30 to 1000 kPa',
  });
}

function customAir(input: AirInput, where: string): Air {
  const temperatureC = statedTemperature(input.temperatureC, `${where}.temperatureC`);
  const pressurePa = statedPressure(input.pressurePa, `${where}.pressurePa`);
  const relativeHumidity = stated(input.relativeHumidity, `${where}.relativeHumidity`, {
    min: 0,
    max: 1,
    code: 'humidity-out-of-range',
    words: '0 to 1 (a fraction)',
  });
  const range = CIPM_2007_RANGE;
  const outside =
    temperatureC < range.minC ||
    temperatureC > range.maxC ||
    pressurePa < range.minPa ||
    pressurePa > range.maxPa;
  return airWith(
    temperatureC + CELSIUS_ZERO_K,
    moistAirDensity(temperatureC, pressurePa, relativeHumidity),
    outside ? ['outside-cipm-2007-range'] : [],
  );
}

/**
 * The air that an input stands for: a named reference state, or moist air by CIPM-2007. Viscosity by Sutherland.
 * Outside 15–27 °C or 600–1100 hPa CIPM-2007 is used, and the notes say so.
 *
 * @throws {Refused} unknown-air-state, missing-input, temperature-out-of-range, pressure-out-of-range, humidity-out-of-range
 */
export function airOf(input: AirInput, where = 'air'): Air {
  const { state } = input;
  if (state == null || state === 'custom') return customAir(input, where);
  if (!isNamedState(state)) {
    refuse('unknown-air-state', `${where}.state`, `There is no reference state of air “${state}”.`);
  }
  return namedAir(state);
}
