import { pressureMistypedAs, temperatureMistypedAs } from '#shared/core/air/mistyped-air';
import { AIR_LIMITS } from '#shared/core/constants';
import type { QuantityFormat } from '../../ui/quantity/quantity-format';
import type { PlanField, TypedPlan } from './plan-form';

/** The section or nozzle that the model stands in [m²]; absent while no tunnel is chosen. */
export interface Section {
  readonly areaM2: number;
}

type Faults = Readonly<Partial<Record<PlanField, string>>>;
type Inputs = TypedPlan['inputs'];

const POSITIVE: readonly PlanField[] = [
  'frontalAreaM2',
  'dragCoefficient',
  'coefficientAreaM2',
  'maximumSpeedKmh',
  'maximumForceN',
  'targetMillions',
  'speedKmh',
];

/**
 * What is wrong with the figures as they are typed, field by field, and what would be accepted. What is typed stays; an
 * empty or unreadable field is the field's own matter.
 */
export function planFaults(inputs: Inputs, section: Section | undefined, format: QuantityFormat): Faults {
  return {
    ...notPositive(inputs),
    ...withFault('targetResultId', sweepFault(inputs)),
    ...withFault('scale', scaleFault(inputs, section, format)),
    ...withFault('speedKmh', speedFault(inputs, format)),
    ...withFault('tunnelTemperatureC', temperatureFault(inputs.tunnelTemperatureC, format)),
    ...withFault('tunnelPressurePa', pressureFault(inputs.tunnelPressurePa, format)),
  };
}

function withFault(field: PlanField, words: string | undefined): Faults {
  return words === undefined ? {} : { [field]: words };
}

function notPositive(inputs: Inputs): Faults {
  const wrong = POSITIVE.filter((field) => {
    const value = inputs[field];
    // What is not asked for any more is not judged: nobody could see why.
    if (field === 'targetMillions' && inputs.targetBasis !== 'typed') return false;
    return typeof value === 'number' && !(value > 0);
  });
  return Object.fromEntries(wrong.map((field) => [field, $localize`A number above 0 is accepted.`]));
}

function sweepFault({ targetBasis, targetResultId }: Inputs): string | undefined {
  return targetBasis === 'sweep' && targetResultId === ''
    ? $localize`Choose the result whose sweep is meant.`
    : undefined;
}

function scaleFault(
  { scale, frontalAreaM2 }: Inputs,
  section: Section | undefined,
  format: QuantityFormat,
): string | undefined {
  if (scale === null) return undefined;
  if (!(scale > 0 && scale <= 1)) {
    return $localize`The scale is model length over full length: above 0, at most 1. One fifth is ${format.value(0.2, 'number', { digits: 1 })}:EXAMPLE:.`;
  }
  if (section === undefined || frontalAreaM2 === null || !(frontalAreaM2 > 0)) return undefined;
  const largest = Math.sqrt(section.areaM2 / frontalAreaM2);
  if (scale < largest) return undefined;
  const model = format.text(scale * scale * frontalAreaM2, 'area', { digits: 2 });
  const place = format.text(section.areaM2, 'area', { digits: 2 });
  // Rounded down: what is named must fit.
  const accepted = format.value(Math.floor(largest * 100) / 100, 'number', { digits: 2 });
  return $localize`The model would be larger than the section: ${model}:MODEL: in ${place}:SECTION:. A scale up to ${accepted}:ACCEPTED: is accepted.`;
}

function speedFault({ speedKmh, maximumSpeedKmh }: Inputs, format: QuantityFormat): string | undefined {
  if (speedKmh === null || !(speedKmh > 0)) return undefined;
  if (maximumSpeedKmh === null || speedKmh <= maximumSpeedKmh) return undefined;
  return $localize`The facility reaches ${format.text(maximumSpeedKmh, 'speed', { digits: 0 })}:SPEED:. A speed up to that is accepted.`;
}

function temperatureFault(typed: number | null, format: QuantityFormat): string | undefined {
  const { minC, maxC } = AIR_LIMITS;
  if (typed === null || (typed >= minC && typed <= maxC)) return undefined;
  const words = format.text(typed, 'temperature', { digits: decimalsOf(typed) });
  const kelvin = temperatureMistypedAs(typed);
  if (kelvin) {
    const accepted = format.text(Math.round(kelvin.converted), 'temperature', { digits: 0 });
    return $localize`${words}:TYPED:: is it kelvin? ${accepted}:ACCEPTED: would be accepted.`;
  }
  const low = format.value(minC, 'temperature', { digits: 0 });
  const high = format.text(maxC, 'temperature', { digits: 0 });
  return $localize`${words}:TYPED: looks mistyped. From ${low}:LOW: to ${high}:HIGH: is accepted.`;
}

function pressureFault(typed: number | null, format: QuantityFormat): string | undefined {
  const { minPa, maxPa } = AIR_LIMITS;
  if (typed === null || (typed >= minPa && typed <= maxPa)) return undefined;
  const words = format.text(typed, 'pressure', { digits: decimalsOf(typed) });
  const meant = pressureMistypedAs(typed);
  if (meant) {
    const accepted = format.text(meant.converted, 'pressure', { digits: 0 });
    return $localize`${words}:TYPED:: is it ${meant.unit}:UNIT:? ${accepted}:ACCEPTED: would be accepted.`;
  }
  const low = format.value(minPa, 'pressure', { digits: 0 });
  const high = format.text(maxPa, 'pressure', { digits: 0 });
  return $localize`${words}:TYPED: looks mistyped. From ${low}:LOW: to ${high}:HIGH: is accepted.`;
}

/** As many digits after the mark as were typed, three at most. */
function decimalsOf(value: number): number {
  return Math.min(3, (String(value).split('.')[1] ?? '').length);
}
