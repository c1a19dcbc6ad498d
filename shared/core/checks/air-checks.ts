import { CIPM_2007_RANGE } from '../constants';
import type { Reduction } from '../reduction/reduction';
import { isTunnel } from '../reduction/result-parts';
import { check, limit, within, type Check } from './check';
import type { CheckLimits } from './limits';
import { pressureSuspicion, temperatureSuspicion } from './unit-suspicion';

/** Whether the density formula covers the run's air; named reference states need none (method section 1). */
function formulaCheck({ parts }: Reduction, temperatureC: number, pressurePa: number): Check {
  const { minC, maxC, minPa, maxPa } = CIPM_2007_RANGE;
  const byTemperature = temperatureC < minC || temperatureC > maxC;
  const outside = parts.air?.notes.includes('outside-cipm-2007-range') === true;
  return check({
    check: 'air-formula',
    verdict: outside ? 'caution' : 'passes',
    ...(outside && !byTemperature
      ? { value: pressurePa, unit: 'Pa', limit: limit({ from: minPa, to: maxPa }) }
      : { value: temperatureC, unit: '°C', limit: limit({ from: minC, to: maxC }) }),
  });
}

/** Whether the air of a test hall is what it usually is; what is not is often a unit. */
function hallChecks(temperatureC: number, pressurePa: number, limits: CheckLimits): Check[] {
  const byTemperature = within(temperatureC, limits.airTemperatureC);
  const byPressure = within(pressurePa, limits.airPressurePa);
  return [
    check({
      check: 'hall-temperature',
      verdict: byTemperature,
      value: temperatureC,
      unit: '°C',
      limit: limit(limits.airTemperatureC),
      policy: 'airTemperatureC',
      finding: byTemperature === 'passes' ? null : temperatureSuspicion(temperatureC, limits.airTemperatureC),
    }),
    check({
      check: 'hall-pressure',
      verdict: byPressure,
      value: pressurePa,
      unit: 'Pa',
      limit: limit(limits.airPressurePa),
      policy: 'airPressurePa',
      finding: byPressure === 'passes' ? null : pressureSuspicion(pressurePa, limits.airPressurePa),
    }),
  ];
}

/** The run's own air; a result quoted in a named reference state has none to check. */
export function airChecks(reduction: Reduction, limits: CheckLimits): Check[] {
  const { result, facility } = reduction.parts;
  const { temperatureC, pressurePa, state } = result.air ?? {};
  if (temperatureC == null || pressurePa == null || (state != null && state !== 'custom')) return [];
  return [
    ...(isTunnel(facility.kind) ? hallChecks(temperatureC, pressurePa, limits) : []),
    formulaCheck(reduction, temperatureC, pressurePa),
  ];
}
