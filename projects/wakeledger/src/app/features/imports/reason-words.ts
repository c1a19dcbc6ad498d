import type { ImportRow, RowReason } from '#shared/contracts/imports';
import type { CheckLanguage } from '../../ui/checks/check-figures';
import { checkSentence } from '../../ui/checks/check-words';

/** A reason in words: those of the rule that refuses a cell, or the check's own, as everywhere else. */
export function reasonWords(reason: RowReason, language: CheckLanguage): string {
  if ('detail' in reason) return reason.detail;
  const sentence = checkSentence(reason.check, language);
  return reason.check.verdict === 'excluded'
    ? $localize`It would be stored and stay out of the ranking. ${sentence}:SENTENCE:`
    : sentence;
}

/** All reasons of a row, or those that mean one column. */
export function rowWords(row: ImportRow | undefined, language: CheckLanguage, column?: number): string {
  return (row?.reasons ?? [])
    .filter((reason) => column === undefined || reason.column === column)
    .map((reason) => reasonWords(reason, language))
    .join(' ');
}
