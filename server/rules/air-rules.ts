import type { AirState } from '#shared/contracts/condition';
import { Issues, type Issue } from './issue';

/** Beyond these, a figure is taken as mistyped (method section 1). */
const TEMPERATURE_C = [-40, 60] as const;
const PRESSURE_PA = [30_000, 1_000_000] as const;
const HUMIDITY = [0, 1] as const;

const within = (value: number | undefined, [low, high]: readonly [number, number]): boolean =>
  value === undefined || (value >= low && value <= high);

/**
 * Air is a named reference state and nothing else, or temperature, pressure and humidity together.
 *
 * @param where the field that holds the air, as a dotted path
 */
export function airIssues(air: AirState, where: string): readonly Issue[] {
  const { temperatureC, pressurePa, relativeHumidity } = air;
  const measured = { temperatureC, pressurePa, relativeHumidity };
  const issues = new Issues();

  if (air.state !== undefined && air.state !== 'custom') {
    for (const [field, value] of Object.entries(measured)) {
      issues.when(
        value !== undefined,
        `${where}.${field}`,
        'A named state of the air fixes this figure already. Leave it out, or state the air as measured.',
      );
    }
    return issues.list;
  }

  for (const [field, value] of Object.entries(measured)) {
    issues.when(
      value === undefined,
      `${where}.${field}`,
      'Measured air needs temperature, static pressure and relative humidity together; or name a reference state.',
      'missing-input',
    );
  }
  return issues
    .when(
      !within(temperatureC, TEMPERATURE_C),
      `${where}.temperatureC`,
      `${temperatureC} °C looks mistyped. From −40 to 60 °C is accepted.`,
      'temperature-out-of-range',
    )
    .when(
      !within(pressurePa, PRESSURE_PA),
      `${where}.pressurePa`,
      `${pressurePa} Pa looks mistyped. From 30 000 to 1 000 000 Pa (300 to 10 000 hPa) is accepted.`,
      'pressure-out-of-range',
    )
    .when(
      !within(relativeHumidity, HUMIDITY),
      `${where}.relativeHumidity`,
      `${relativeHumidity} is not a fraction. From 0 to 1 is accepted; 45 % is 0.45.`,
      'humidity-out-of-range',
    ).list;
}
