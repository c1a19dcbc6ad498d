import { parseTypedNumber } from '../../core/numbers/parse-typed-number';

/** Reference areas that are taken for one [m²]. */
const RANGE = { minimum: 0.01, maximum: 99 };

/** A typed reference area [m²]; null where it is none. */
export function typedArea(text: string): number | null {
  const read = parseTypedNumber(text, RANGE);
  if (read.kind !== 'number') return null;
  return read.value >= RANGE.minimum && read.value <= RANGE.maximum ? read.value : null;
}
