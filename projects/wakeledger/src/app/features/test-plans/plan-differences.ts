import type { Result } from '#shared/contracts/results';
import type { TestPlan } from '#shared/contracts/test-plans';
import { CELSIUS_ZERO_K, KMH_PER_MS, REFERENCE_AIR } from '#shared/core/constants';
import { dryAirDensity } from '#shared/core/air/gas-properties';
import { differingItems } from '#shared/core/similarity/condition';
import { speedOfDynamicPressure } from '#shared/core/similarity/flow';
import type { NumberLocale } from '../../core/numbers/number-locale';
import { conditionItemWord, conditionValueWords, isConditionItem } from '../../ui/condition/condition-words';
import type { QuantityFormat } from '../../ui/quantity/quantity-format';

/** How far a result may lie from its plan before it is said: settings are never met to the last digit. */
const SPEED_TOLERANCE = 0.02;
const SCALE_TOLERANCE = 0.001;
const TEMPERATURE_TOLERANCE_K = 5;
const PRESSURE_TOLERANCE = 0.03;

interface Air {
  readonly temperatureC: number;
  readonly pressurePa: number;
}

function airOf({ air }: Result): Air | undefined {
  if (air?.state !== undefined && air.state !== 'custom') {
    const { temperatureK, pressurePa } = REFERENCE_AIR[air.state];
    return { temperatureC: temperatureK - CELSIUS_ZERO_K, pressurePa };
  }
  const { temperatureC, pressurePa } = air ?? {};
  return temperatureC === undefined || pressurePa === undefined ? undefined : { temperatureC, pressurePa };
}

/** The speeds of a result [km/h]: its own or those of its points; from the dynamic pressure where no speed is stated. */
function speedsOf(result: Result): readonly number[] {
  const air = airOf(result);
  const fromPressure = (q: number | undefined): number | undefined =>
    q === undefined || air === undefined
      ? undefined
      : speedOfDynamicPressure(q, dryAirDensity(air.temperatureC + CELSIUS_ZERO_K, air.pressurePa)) *
        KMH_PER_MS;
  const own = result.speedKmh ?? fromPressure(result.dynamicPressurePa);
  return result.points.flatMap((point) => {
    const speed = point.speedKmh ?? fromPressure(point.dynamicPressurePa) ?? own;
    return speed === undefined ? [] : [speed];
  });
}

/** In what a result departs from the plan that it was expected by, in words; empty where it went as planned. */
export function planDifferences(
  plan: TestPlan,
  result: Result,
  format: QuantityFormat,
  locale: NumberLocale,
): readonly string[] {
  return [
    ...scaleDifference(plan, result, format),
    ...speedDifference(plan, result, format),
    ...airDifferences(plan, result, format),
    ...turbulenceDifference(plan, result),
    ...conditionDifferences(plan, result, locale),
  ];
}

function scaleDifference({ inputs }: TestPlan, { scale }: Result, format: QuantityFormat): readonly string[] {
  if (Math.abs(scale / inputs.scale - 1) <= SCALE_TOLERANCE) return [];
  const text = (value: number) => format.value(value, 'number', { digits: 3 });
  return [$localize`scale ${text(scale)}:MEASURED: instead of ${text(inputs.scale)}:PLANNED:`];
}

function speedDifference({ inputs }: TestPlan, result: Result, format: QuantityFormat): readonly string[] {
  const { speedKmh } = inputs;
  const speeds = speedsOf(result);
  if (speedKmh === undefined) return [];
  if (speeds.length === 0) return [$localize`no speed stated`];
  const [slowest, fastest] = [Math.min(...speeds), Math.max(...speeds)];
  if (speedKmh >= slowest * (1 - SPEED_TOLERANCE) && speedKmh <= fastest * (1 + SPEED_TOLERANCE)) return [];
  const text = (value: number) => format.text(value, 'speed', { digits: 0 });
  return fastest / slowest - 1 > SPEED_TOLERANCE
    ? [
        $localize`${text(slowest)}:SLOWEST: to ${text(fastest)}:FASTEST: instead of ${text(speedKmh)}:PLANNED:`,
      ]
    : [$localize`${text(fastest)}:MEASURED: instead of ${text(speedKmh)}:PLANNED:`];
}

function airDifferences({ inputs }: TestPlan, result: Result, format: QuantityFormat): readonly string[] {
  const air = airOf(result);
  if (air === undefined) return [];
  const degrees = (value: number) => format.text(value, 'temperature', { digits: 0 });
  const pascals = (value: number) => format.text(value, 'pressure', { digits: 0 });
  return [
    ...(Math.abs(air.temperatureC - inputs.tunnelTemperatureC) > TEMPERATURE_TOLERANCE_K
      ? [
          $localize`air at ${degrees(air.temperatureC)}:MEASURED: instead of ${degrees(inputs.tunnelTemperatureC)}:PLANNED:`,
        ]
      : []),
    ...(Math.abs(air.pressurePa / inputs.tunnelPressurePa - 1) > PRESSURE_TOLERANCE
      ? [
          $localize`${pascals(air.pressurePa)}:MEASURED: instead of ${pascals(inputs.tunnelPressurePa)}:PLANNED:`,
        ]
      : []),
  ];
}

function turbulenceDifference({ inputs }: TestPlan, result: Result): readonly string[] {
  const planned = inputs.turbulence === true;
  const measured = result.turbulenceGenerationOrTrips === true;
  if (planned === measured || result.scale >= 1) return [];
  return [
    measured
      ? $localize`with turbulence or trips, not planned`
      : $localize`without the planned turbulence or trips`,
  ];
}

function conditionDifferences(
  { inputs }: TestPlan,
  { condition }: Result,
  locale: NumberLocale,
): readonly string[] {
  return differingItems(inputs.condition, condition)
    .filter(isConditionItem)
    .map((item) => {
      const measured = conditionValueWords(item, condition[item], locale);
      const expected = conditionValueWords(item, inputs.condition[item], locale);
      return $localize`${conditionItemWord(item)}:ITEM: ${measured}:MEASURED: instead of ${expected}:PLANNED:`;
    });
}

/** The results that a plan expected: of its variant in its facility, entered since it is expected, newest first. */
export function resultsOfPlan(plan: TestPlan, results: readonly Result[]): readonly Result[] {
  const { expectedSince, variantId, facilityId } = plan;
  if (expectedSince === undefined) return [];
  return results
    .filter(
      (result) =>
        result.variantId === variantId &&
        result.facilityId === facilityId &&
        result.withdrawn === undefined &&
        Date.parse(result.enteredAt) >= Date.parse(expectedSince),
    )
    .sort((one, other) => other.entrySequence - one.entrySequence);
}
