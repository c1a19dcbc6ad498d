import { parseTypedNumber, within } from '../../../core/numbers/parse-typed-number';

export interface Accepted {
  readonly minimum: number;
  readonly maximum: number;
}

/** What was typed: a number, nothing, or something that cannot be used. */
export type TypedValue = number | 'nothing' | 'unusable';

export function typedValue(text: string, accepted: Accepted): TypedValue {
  if (text.trim() === '') return 'nothing';
  const read = parseTypedNumber(text, accepted);
  return read.kind === 'number' && within(read.value, accepted) ? read.value : 'unusable';
}
