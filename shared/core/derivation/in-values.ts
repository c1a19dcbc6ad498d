/** A formula in values: words and numbers apart, so that a screen can write the numbers as a person reads them. */
export type InValues = readonly (string | number)[];

/** A computed number does not end; of its digits so many are written out where it is copied. */
const COMPUTED_DIGITS = 7;
/** What was typed or follows from it in a few steps ends within so many digits and keeps them all. */
const TYPED_DIGITS = 12;

/** A number plain and machine-readable: whole as it was typed, with seven significant digits where it was computed. */
export function plain(value: number): string {
  const whole = String(value);
  const digits = whole.replace(/e.*$/, '').replace(/\D/g, '').replace(/^0+/, '');
  return digits.length <= TYPED_DIGITS ? whole : String(Number(value.toPrecision(COMPUTED_DIGITS)));
}

/**
 * Tag of a formula in values: `inValues\`q = ${pressurePa} Pa\``. Parts may be formulas in values themselves; what is not
 * there leaves nothing behind. Symbols are written as in plain text, `C_D`.
 */
export function inValues(
  words: readonly string[],
  ...values: readonly (string | number | null | undefined | InValues)[]
): InValues {
  const parts = words.flatMap((word, index): InValues => {
    const value = values[index];
    if (value === null || value === undefined) return [word];
    return typeof value === 'string' || typeof value === 'number' ? [word, value] : [word, ...value];
  });
  return parts.filter((part) => part !== '');
}

/** Formulas in values, one after the other. */
export function joined(formulas: readonly InValues[], separator: string): InValues {
  return formulas.flatMap((formula, index) => (index === 0 ? formula : [separator, ...formula]));
}

/** A formula in values as plain text, every number machine-readable. */
export function valuesAsText(values: InValues): string {
  return values.map((part) => (typeof part === 'number' ? plain(part) : part)).join('');
}
