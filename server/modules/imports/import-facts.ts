import { createHash } from 'node:crypto';
import type { ImportColumn, ImportDetail, ImportMapping } from '#shared/contracts/imports';
import type { OpenQuestions } from './checking/compiled-mapping';
import { guessedMapping } from './reading/guessed-mapping';
import type { FileRead } from './reading/read-file';

/** What was found in the file, as it is kept with the import. */
export type ImportFacts = Pick<
  ImportDetail,
  | 'encoding'
  | 'delimiter'
  | 'sheets'
  | 'sheet'
  | 'decimalFound'
  | 'dateOrderFound'
  | 'blankLines'
  | 'notes'
  | 'columns'
  | 'mappingRemembered'
>;

export function importFacts(read: FileRead, mappingRemembered: boolean): ImportFacts {
  const { encoding, delimiter, sheets, sheet, decimalFound, dateOrderFound, blankLines, notes } = read;
  return {
    ...(encoding === undefined ? {} : { encoding }),
    ...(delimiter === undefined ? {} : { delimiter }),
    ...(sheets === undefined ? {} : { sheets: sheets.map((one) => ({ ...one })) }),
    ...(sheet === undefined ? {} : { sheet }),
    ...(decimalFound === undefined ? {} : { decimalFound }),
    ...(dateOrderFound === undefined ? {} : { dateOrderFound }),
    blankLines,
    notes: [...notes],
    columns: read.headings.map((header, index) => columnOf(read, header, index)),
    mappingRemembered,
  };
}

function columnOf(read: FileRead, header: string, index: number): ImportColumn {
  const guess = read.guesses.find((one) => one.index === index);
  return {
    index,
    header,
    samples: [...(read.columns[index]?.samples ?? [])],
    ...(guess === undefined ? {} : { guessedField: guess.field }),
    ...(guess?.unit === undefined ? {} : { guessedUnit: guess.unit }),
  };
}

export function openQuestions(facts: ImportFacts): OpenQuestions {
  return { decimal: facts.decimalFound === 'ambiguous', dateOrder: facts.dateOrderFound === 'ambiguous' };
}

/** Files of one kind are recognised by their headings, capital letters and spaces aside. */
export function headerHash(headings: readonly string[]): string {
  return createHash('sha256')
    .update(headings.map((heading) => heading.toLowerCase().trim()).join('\u001f'))
    .digest('hex');
}

/**
 * The mapping to begin with: the one that the organisation used for these headings, else the guess. How numbers and dates
 * are written is a matter of the file, so that is always this file's own.
 */
export function firstMapping(read: FileRead, remembered: ImportMapping | undefined): ImportMapping {
  const guessed = guessedMapping(read);
  if (remembered === undefined) return guessed;
  const { decimal: _decimal, dateOrder: _dateOrder, ...columns } = remembered;
  return {
    ...columns,
    ...(guessed.decimal === undefined ? {} : { decimal: guessed.decimal }),
    ...(guessed.dateOrder === undefined ? {} : { dateOrder: guessed.dateOrder }),
  };
}

/** What is worth remembering for the next file: not the choices about variants, which their aliases remember. */
export function memorable(mapping: ImportMapping): ImportMapping {
  return { ...mapping, variants: [] };
}
