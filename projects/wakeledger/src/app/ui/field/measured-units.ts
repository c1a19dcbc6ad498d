import { KMH_PER_MS, KM_PER_MILE } from '#shared/core/constants';

/** A unit in which a person may type: base value = typed × factor + offset. The first of a list is the base. */
export interface TypedUnit {
  readonly unit: string;
  readonly factor: number;
}

export const SPEED_UNITS: readonly TypedUnit[] = [
  { unit: 'km/h', factor: 1 },
  { unit: 'm/s', factor: KMH_PER_MS },
  { unit: 'mph', factor: KM_PER_MILE },
];
export const PRESSURE_UNITS: readonly TypedUnit[] = [
  { unit: 'Pa', factor: 1 },
  { unit: 'hPa', factor: 100 },
  { unit: 'kPa', factor: 1000 },
];

/**
 * The value in the base unit. Rounded to 14 digits, so that 99.84 kPa is 99840 Pa and not 99840.00000000001.
 */
export function inBaseUnit(value: number, unit: string, units: readonly TypedUnit[]): number {
  const factor = units.find((each) => each.unit === unit)?.factor ?? 1;
  return factor === 1 ? value : Number((value * factor).toPrecision(14));
}

/** A limit in the base unit, as it reads in the chosen one. */
export function limitIn(limit: number, unit: string, units: readonly TypedUnit[]): number {
  const factor = units.find((each) => each.unit === unit)?.factor ?? 1;
  return Number((limit / factor).toPrecision(6));
}
