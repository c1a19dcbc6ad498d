/** Building blocks of formulas as MathML Core; no `math` element around them, so that parts can be put together. */

export const row = (...parts: readonly string[]): string => `<mrow>${parts.join('')}</mrow>`;
/** An identifier. */
export const mi = (name: string): string => `<mi>${name}</mi>`;
export const mn = (number: number | string): string => `<mn>${number}</mn>`;
export const mo = (sign: string): string => `<mo>${sign}</mo>`;
export const mtext = (words: string): string => `<mtext>${words}</mtext>`;
/** A letter with a subscript: `sub('C', 'D')` is C_D. */
export const sub = (letter: string, index: string): string => `<msub>${mi(letter)}${mi(index)}</msub>`;
export const sup = (base: string, exponent: string): string => `<msup>${base}${exponent}</msup>`;
export const squared = (base: string): string => sup(base, mn(2));
export const frac = (above: string, below: string): string => `<mfrac>${above}${below}</mfrac>`;
export const sqrt = (inner: string): string => `<msqrt>${inner}</msqrt>`;
export const bracketed = (...parts: readonly string[]): string => row(mo('('), ...parts, mo(')'));
/** A bar over it: a mean. */
export const mover = (base: string): string => `<mover>${base}<mo>¯</mo></mover>`;
export const equals = mo('=');
export const plus = mo('+');
export const minus = mo('−');
export const times = mo('·');
export const math = (...parts: readonly string[]): string => `<math>${row(...parts)}</math>`;
