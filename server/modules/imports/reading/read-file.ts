import { dateOrderOf, decimalOf } from './column-survey';
import type { DateOrder } from './dates';
import { EncodingWatch, encodingInWords, type EncodingFound } from './encoding';
import { otherKindOfFile, wayOut } from './file-kind';
import { guessColumns, type ColumnGuess } from './guess-columns';
import type { Decimal } from './numbers';
import { decoded, readTable, UnreadableFile, type TableFacts, type TableRow } from './read-table';

/** Everything that a file shows by itself, before anybody says what its columns mean. */
export interface FileRead extends TableFacts {
  readonly encoding: EncodingFound['encoding'];
  readonly decimalFound: Decimal | 'ambiguous' | undefined;
  readonly dateOrderFound: DateOrder | 'ambiguous' | undefined;
  readonly guesses: readonly ColumnGuess[];
}

const CHUNK_BYTES = 64 * 1024;

/**
 * Reads the bytes of an import: what kind of file, which encoding, which delimiter, which headings; hands over the rows in
 * batches. Beside the bytes themselves memory stays constant.
 *
 * @throws {UnreadableFile} with words for a person
 */
export async function readImportFile(
  content: Uint8Array,
  store: (rows: readonly TableRow[]) => Promise<void>,
): Promise<FileRead> {
  if (content.length === 0)
    throw new UnreadableFile(
      'unusable-input',
      'The file is empty. Bring in a CSV file with a row of headings and rows of results.',
    );
  const looksLike = otherKindOfFile(content.subarray(0, 4096));
  if (looksLike !== undefined)
    throw new UnreadableFile(
      'unsupported-file',
      `This is not a CSV file: by its content it looks like ${looksLike}, whatever its name says. ${wayOut(looksLike)}`,
    );
  const found = encodingOf(content);
  const facts = await readTable(decoded(chunksOf(content), found.encoding), store);
  const kinds = facts.columns.map((column, index) => ({
    header: facts.headings[index] ?? '',
    holdsNumbers: column.holdsNumbers,
    holdsDates: column.holdsDates,
  }));
  return {
    ...facts,
    encoding: found.encoding,
    decimalFound: decimalOf(facts.columns),
    dateOrderFound: dateOrderOf(facts.columns),
    guesses: guessColumns(kinds),
    notes: [encodingInWords(found), ...facts.notes],
  };
}

function encodingOf(content: Uint8Array): EncodingFound {
  const watch = new EncodingWatch();
  for (let at = 0; at < content.length && watch.trouble === undefined; at += CHUNK_BYTES)
    watch.feed(content.subarray(at, at + CHUNK_BYTES));
  const found = watch.end();
  if ('notText' in found)
    throw new UnreadableFile('unsupported-file', `This is not a CSV file. ${found.notText} ${wayOut('')}`);
  return found;
}

async function* chunksOf(content: Uint8Array): AsyncGenerator<Uint8Array> {
  for (let at = 0; at < content.length; at += CHUNK_BYTES) yield content.subarray(at, at + CHUNK_BYTES);
}
