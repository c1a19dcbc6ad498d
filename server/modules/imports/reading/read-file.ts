import { dateOrderOf, decimalOf } from './column-survey';
import type { DateOrder } from './dates';
import { EncodingWatch, encodingInWords, type EncodingFound } from './encoding';
import { isZip, otherKindOfFile, wayOut } from './file-kind';
import { guessColumns, type ColumnGuess } from './guess-columns';
import type { Decimal } from './numbers';
import { decoded, readTable, type TextTableFacts } from './read-table';
import type { TableFacts, TableRow } from './table-under-way';
import { UnreadableFile } from './unreadable-file';
import { readWorkbook, type WorkbookSheet } from './workbook/read-workbook';

/** Everything that a file shows by itself, before anybody says what its columns mean. */
export interface FileRead extends TableFacts {
  /** Of a file of text. */
  readonly encoding?: EncodingFound['encoding'];
  readonly delimiter?: TextTableFacts['delimiter'];
  /** Of a workbook: its sheets, and the place of the one that was read. */
  readonly sheets?: readonly WorkbookSheet[];
  readonly sheet?: number;
  readonly decimalFound: Decimal | 'ambiguous' | undefined;
  readonly dateOrderFound: DateOrder | 'ambiguous' | undefined;
  readonly guesses: readonly ColumnGuess[];
}

const CHUNK_BYTES = 64 * 1024;

/**
 * Reads the bytes of an import: what kind of file, which encoding and delimiter or which sheet, which headings; hands over
 * the rows in batches. Beside the bytes themselves memory stays bounded.
 *
 * @param sheet of a workbook, the place of the sheet that a person chose
 * @throws {UnreadableFile} with words for a person
 */
export async function readImportFile(
  content: Uint8Array,
  store: (rows: readonly TableRow[]) => Promise<void>,
  sheet?: number,
): Promise<FileRead> {
  if (content.length === 0)
    throw new UnreadableFile(
      'unusable-input',
      'The file is empty. Bring in a CSV file or a workbook (.xlsx) with a row of headings and rows of results.',
    );
  const looksLike = otherKindOfFile(content);
  if (looksLike !== undefined)
    throw new UnreadableFile(
      'unsupported-file',
      `This is neither a CSV file nor a workbook (.xlsx): by its content it looks like ${looksLike}, whatever its name says. ${wayOut(looksLike)}`,
    );
  return isZip(content) ? readSheets(content, store, sheet) : readText(content, store);
}

async function readText(
  content: Uint8Array,
  store: (rows: readonly TableRow[]) => Promise<void>,
): Promise<FileRead> {
  const found = encodingOf(content);
  const facts = await readTable(decoded(chunksOf(content), found.encoding), store);
  return {
    ...facts,
    encoding: found.encoding,
    decimalFound: decimalOf(facts.columns),
    ...guessesOf(facts),
    notes: [encodingInWords(found), ...facts.notes],
  };
}

async function readSheets(
  content: Uint8Array,
  store: (rows: readonly TableRow[]) => Promise<void>,
  sheet: number | undefined,
): Promise<FileRead> {
  const read = await readWorkbook(content, store, sheet);
  return {
    headings: read.headings,
    columns: read.columns,
    rowCount: read.rowCount,
    blankLines: read.blankLines,
    notes: read.notes,
    sheets: read.sheets,
    sheet: read.sheet,
    // A cell that is a number leaves nothing open; only where all are texts do their signs decide.
    decimalFound: read.numberCells > 0 ? 'point' : decimalOf(read.columns),
    ...guessesOf(read),
  };
}

function guessesOf(facts: TableFacts): Pick<FileRead, 'dateOrderFound' | 'guesses'> {
  const kinds = facts.columns.map((column, index) => ({
    header: facts.headings[index] ?? '',
    holdsNumbers: column.holdsNumbers,
    holdsDates: column.holdsDates,
  }));
  return { dateOrderFound: dateOrderOf(facts.columns), guesses: guessColumns(kinds) };
}

function encodingOf(content: Uint8Array): EncodingFound {
  const watch = new EncodingWatch();
  for (let at = 0; at < content.length && watch.trouble === undefined; at += CHUNK_BYTES)
    watch.feed(content.subarray(at, at + CHUNK_BYTES));
  const found = watch.end();
  if ('notText' in found)
    throw new UnreadableFile('unsupported-file', `This is no CSV file. ${found.notText} ${wayOut('')}`);
  return found;
}

async function* chunksOf(content: Uint8Array): AsyncGenerator<Uint8Array> {
  for (let at = 0; at < content.length; at += CHUNK_BYTES) yield content.subarray(at, at + CHUNK_BYTES);
}
