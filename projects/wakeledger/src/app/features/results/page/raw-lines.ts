import type { AirState } from '#shared/contracts/condition';
import type { Result } from '#shared/contracts/results';
import type { QuantityFormat } from '../../../ui/quantity/quantity-format';
import { AIR_STATE_WORDS, QUANTITY_UNITS, QUANTITY_WORDS } from '../../../ui/words/evidence-words';

export interface RawLine {
  readonly label: string;
  readonly words: string;
}

/** Everything that came with a result besides its points and condition, exactly as it came; only what is stated. */
export function rawLines(result: Result, format: QuantityFormat): readonly RawLine[] {
  const unit = QUANTITY_UNITS[result.quantity];
  const line = (label: string, words: string | undefined): readonly RawLine[] =>
    words === undefined || words === '' ? [] : [{ label, words }];
  const typed = (value: number | undefined, of: string): string | undefined =>
    value === undefined ? undefined : `${exactly(value, format)}${of === '' ? '' : `\u202f${of}`}`;
  return [
    ...line($localize`Quantity`, QUANTITY_WORDS[result.quantity]),
    ...line(
      $localize`Scale`,
      result.scale === 1 ? $localize`full size` : $localize`${exactly(result.scale, format)}:SCALE: model`,
    ),
    ...line($localize`Area it was formed with`, areaWords(result, typed)),
    ...line($localize`Speed`, typed(result.speedKmh, 'km/h')),
    ...line($localize`Dynamic pressure`, typed(result.dynamicPressurePa, 'Pa')),
    ...line($localize`Air`, result.air && airWords(result.air, format)),
    ...line($localize`Tare`, tareWords(result, typed)),
    ...line($localize`Blockage corrected already by`, result.blockageAlreadyCorrectedBy),
    ...line(
      $localize`Turbulence generation or trips`,
      result.turbulenceGenerationOrTrips === undefined
        ? undefined
        : result.turbulenceGenerationOrTrips
          ? $localize`yes`
          : $localize`no`,
    ),
    ...line($localize`Uncertainty stated by the source`, statedWords(result, unit, typed)),
    ...line($localize`Session`, result.session),
    ...line($localize`Installation`, result.installation),
    ...line($localize`Model`, result.model),
    ...line($localize`Source`, result.source),
    ...line($localize`Remark`, result.remark),
  ];
}

type Typed = (value: number | undefined, unit: string) => string | undefined;

/** All the digits that came, none added. */
export function exactly(value: number, format: QuantityFormat): string {
  return format.value(value, 'number', { digits: Math.min(12, (String(value).split('.')[1] ?? '').length) });
}

function areaWords(
  { quotedAreaM2, quotedAreaUM2, quotedAreaScale }: Result,
  typed: Typed,
): string | undefined {
  if (quotedAreaM2 === undefined) return undefined;
  const where = quotedAreaScale === 'model' ? $localize`at model scale` : $localize`at full scale`;
  const u = quotedAreaUM2 === undefined ? '' : `, u = ${typed(quotedAreaUM2, 'm²') ?? ''}`;
  return `${typed(quotedAreaM2, 'm²') ?? ''} ${where}${u}`;
}

export function airWords(air: AirState, format: QuantityFormat): string {
  if (air.state !== undefined && air.state !== 'custom') return AIR_STATE_WORDS[air.state];
  return [
    air.temperatureC === undefined ? '' : `${exactly(air.temperatureC, format)}\u202f°C`,
    air.pressurePa === undefined ? '' : `${exactly(air.pressurePa, format)}\u202fPa`,
    air.relativeHumidity === undefined
      ? ''
      : $localize`${format.text(air.relativeHumidity * 100, 'percent')}:HUMIDITY: humidity`,
  ]
    .filter((part) => part !== '')
    .join(', ');
}

function tareWords({ tareAlreadySubtracted, tareN, points }: Result, typed: Typed): string | undefined {
  if (tareAlreadySubtracted === true) return $localize`subtracted already`;
  if (tareAlreadySubtracted === undefined) return undefined;
  if (tareN !== undefined) return $localize`${typed(tareN, 'N')}:TARE:, still in the force`;
  return points.some((point) => point.tareN !== undefined)
    ? $localize`still in the force, stated with each point`
    : undefined;
}

function statedWords({ stated }: Result, unit: string, typed: Typed): string | undefined {
  if (!stated) return undefined;
  const { expandedU, k, degreesOfFreedom, includesFacilityBias } = stated;
  return [
    `U = ${typed(expandedU, unit) ?? ''}`,
    `k = ${typed(k, '') ?? ''}`,
    degreesOfFreedom === undefined ? '' : `ν = ${degreesOfFreedom}`,
    includesFacilityBias === true ? $localize`the facility’s bias included` : '',
  ]
    .filter((part) => part !== '')
    .join(', ');
}
