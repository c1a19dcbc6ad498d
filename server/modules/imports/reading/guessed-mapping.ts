import type { ImportMapping } from '#shared/contracts/imports';
import type { FileRead } from './read-file';

/** The mapping that a file suggests by itself; what it leaves open stays open and is asked. */
export function guessedMapping(
  read: Pick<FileRead, 'guesses' | 'decimalFound' | 'dateOrderFound'>,
): ImportMapping {
  const { decimalFound, dateOrderFound } = read;
  return {
    ...(decimalFound === undefined || decimalFound === 'ambiguous' ? {} : { decimal: decimalFound }),
    ...(dateOrderFound === undefined || dateOrderFound === 'ambiguous' ? {} : { dateOrder: dateOrderFound }),
    columns: read.guesses.map((guess) => ({ ...guess })),
    constants: [],
    variants: [],
    facilities: [],
  };
}
