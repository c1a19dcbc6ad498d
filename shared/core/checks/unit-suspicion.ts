import type { AirInput } from '../air/air-input';
import { AIR_LIMITS, CELSIUS_ZERO_K } from '../constants';
import type { Check, CheckFinding } from './check';
import type { LimitRange } from './limits';

const inside = (value: number, { from, to }: LimitRange): boolean => value >= from && value <= to;

/** Degrees Fahrenheit as degrees Celsius: definition. */
export const celsiusOfFahrenheit = (fahrenheit: number): number => (fahrenheit - 32) / 1.8;

/**
 * What unit a temperature that was taken for °C was probably typed in: the one in which it would be usual. Null where
 * none fits.
 */
export function temperatureSuspicion(typed: number, usualC: LimitRange): CheckFinding | null {
  if (inside(typed - CELSIUS_ZERO_K, usualC)) return 'kelvin';
  return inside(celsiusOfFahrenheit(typed), usualC) ? 'fahrenheit' : null;
}

const PRESSURE_UNITS = [
  ['hectopascal', 100],
  ['kilopascal', 1000],
  ['bar', 100000],
] as const;

/** The same for a static pressure that was taken for Pa; a standard atmosphere counts as usual everywhere. */
export function pressureSuspicion(typed: number, usualPa: LimitRange): CheckFinding | null {
  return PRESSURE_UNITS.find(([, pascals]) => inside(typed * pascals, usualPa))?.[0] ?? null;
}

type SuspectedAir = Partial<Pick<Check, 'value' | 'unit' | 'finding'>>;

const suspected = (value: number, unit: Check['unit'], finding: CheckFinding | null): SuspectedAir => ({
  value,
  unit,
  finding,
});

/** Which value of the air was refused and what unit it probably has; the codes are those of `airOf`. */
export function refusedAir(
  code: string,
  air: AirInput | null | undefined,
  usual: { readonly airTemperatureC: LimitRange; readonly airPressurePa: LimitRange },
): SuspectedAir {
  const { temperatureC, pressurePa, relativeHumidity } = air ?? {};
  if (code === 'temperature-out-of-range' && temperatureC != null) {
    const possible = { from: AIR_LIMITS.minC, to: AIR_LIMITS.maxC };
    const finding =
      temperatureSuspicion(temperatureC, usual.airTemperatureC) ??
      temperatureSuspicion(temperatureC, possible);
    return suspected(temperatureC, '°C', finding);
  }
  if (code === 'pressure-out-of-range' && pressurePa != null) {
    return suspected(pressurePa, 'Pa', pressureSuspicion(pressurePa, usual.airPressurePa));
  }
  if (code === 'humidity-out-of-range' && relativeHumidity != null) {
    const isPercent = relativeHumidity > 1 && relativeHumidity <= 100;
    return suspected(relativeHumidity, 'number', isPercent ? 'percent' : null);
  }
  return {};
}
