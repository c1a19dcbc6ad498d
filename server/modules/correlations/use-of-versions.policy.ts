import type { CorrelationAdoption, CorrelationSummary } from '#shared/contracts/correlations';

/** What was said once about the use of a correlation. */
export type UseWord = Pick<CorrelationAdoption, 'versionNumber' | 'effectiveDate'>;

/**
 * The word that holds on a day: of those whose date has come the one with the latest date, of equal dates the one said last.
 *
 * @param words in the order in which they were said
 */
export function wordOn<Word extends UseWord>(words: readonly Word[], day: string): Word | undefined {
  return words
    .filter(({ effectiveDate }) => effectiveDate <= day)
    .reduce<Word | undefined>(
      (holding, word) =>
        holding === undefined || word.effectiveDate >= holding.effectiveDate ? word : holding,
      undefined,
    );
}

/** Which version is used on a day, and since when; undefined where none is. */
export function inUseOn(words: readonly UseWord[], day: string): CorrelationSummary['inUse'] {
  const word = wordOn(words, day);
  return word?.versionNumber === undefined
    ? undefined
    : { versionNumber: word.versionNumber, since: word.effectiveDate };
}

/** Whether any version is used on some day from the given one on. */
export function usedFrom(words: readonly UseWord[], day: string): boolean {
  return (
    inUseOn(words, day) !== undefined ||
    words.some(({ effectiveDate, versionNumber }) => effectiveDate > day && versionNumber !== undefined)
  );
}
