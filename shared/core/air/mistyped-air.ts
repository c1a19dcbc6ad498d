import { AIR_LIMITS, CELSIUS_ZERO_K } from '../constants';

/** A typed figure that is out of range as it stands and would be in range in another unit, with what it then is. */
export interface MistypedUnit<Unit extends string> {
  readonly unit: Unit;
  /** The same figure in the unit that was asked for. */
  readonly converted: number;
}

const within = (value: number, low: number, high: number): boolean => value >= low && value <= high;

/** Pascals in one of each unit in which pressures are usually read (exact). */
const PASCALS = { hPa: 100, kPa: 1000, bar: 100_000 } as const;

/**
 * Whether a temperature that is out of range as degrees Celsius would be in range as kelvin. Undefined where it is in
 * range as it stands (nothing is guessed then), or in neither.
 */
export function temperatureMistypedAs(typedC: number): MistypedUnit<'K'> | undefined {
  const { minC, maxC } = AIR_LIMITS;
  if (within(typedC, minC, maxC)) return undefined;
  const converted = typedC - CELSIUS_ZERO_K;
  return within(converted, minC, maxC) ? { unit: 'K', converted } : undefined;
}

/**
 * In which other unit a pressure that is out of range as pascals would be in range: hectopascals (millibars),
 * kilopascals or bar, the first that fits. Undefined where it is in range as it stands, or in none.
 */
export function pressureMistypedAs(typedPa: number): MistypedUnit<keyof typeof PASCALS> | undefined {
  const { minPa, maxPa } = AIR_LIMITS;
  if (within(typedPa, minPa, maxPa)) return undefined;
  for (const unit of ['hPa', 'kPa', 'bar'] as const) {
    const converted = typedPa * PASCALS[unit];
    if (within(converted, minPa, maxPa)) return { unit, converted };
  }
  return undefined;
}
