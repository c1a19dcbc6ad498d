import { Readable } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import { CsvError, parse } from 'csv-parse';
import { guessDelimiter, RECORD_OPTIONS, type Delimiter } from './delimiter';
import type { Encoding } from './encoding';
import { TableUnderWay, type TableFacts, type TableRow } from './table-under-way';
import { UnreadableFile } from './unreadable-file';

export interface TextTableFacts extends TableFacts {
  readonly delimiter: Delimiter;
}

const BEGINNING_CHARACTERS = 64 * 1024;

/** Bytes as text, chunk by chunk; a byte-order mark goes, a NUL is refused. */
export async function* decoded(bytes: AsyncIterable<Uint8Array>, encoding: Encoding): AsyncGenerator<string> {
  const decoder = new TextDecoder(encoding);
  for await (const chunk of bytes) yield withoutNul(decoder.decode(chunk, { stream: true }));
  yield withoutNul(decoder.decode());
}

function withoutNul(text: string): string {
  if (text.includes('\0'))
    throw new UnreadableFile('unsupported-file', 'The file holds NUL characters, which no text does.');
  return text;
}

/**
 * Reads a text as a table, handing over its rows in batches: memory does not grow with the file. The first row with two
 * filled cells or more is the heading; what stands above it is passed over and said.
 *
 * @throws {UnreadableFile} without a heading, without rows, with too many rows or columns, with an open quotation mark
 */
export async function readTable(
  text: AsyncIterable<string>,
  store: (rows: readonly TableRow[]) => Promise<void>,
): Promise<TextTableFacts> {
  const { beginning, whole } = await withBeginning(text);
  const delimiter = guessDelimiter(beginning);
  const parser = parse({ ...RECORD_OPTIONS, delimiter });
  // The loop below meets whatever goes wrong in the source, because the pipeline ends the parser with it.
  const feeding = pipeline(Readable.from(whole), parser).catch(() => undefined);
  const table = new TableUnderWay(store);
  try {
    for await (const record of parser as AsyncIterable<string[]>) await table.take(record);
  } catch (error) {
    throw inWords(error);
  } finally {
    parser.destroy();
    await feeding;
  }
  return { delimiter, ...(await table.finish()) };
}

/** Holds back enough text for guesses, then hands the whole on. */
async function withBeginning(
  text: AsyncIterable<string>,
): Promise<{ readonly beginning: string; readonly whole: AsyncIterable<string> }> {
  const source = text[Symbol.asyncIterator]();
  let beginning = '';
  let ended = false;
  while (beginning.length < BEGINNING_CHARACTERS && !ended) {
    const next = await source.next();
    if (next.done === true) ended = true;
    else beginning += next.value;
  }
  async function* whole(): AsyncGenerator<string> {
    yield beginning;
    while (!ended) {
      const next = await source.next();
      if (next.done === true) return;
      yield next.value;
    }
  }
  return { beginning, whole: whole() };
}

/** The parser counts lines to the end of the file; the row that it could not finish comes after those it had finished. */
function inWords(error: unknown): unknown {
  if (!(error instanceof CsvError)) return error;
  const row = typeof error['records'] === 'number' ? error['records'] + 1 : 1;
  const open = `A quotation mark that opens in row ${String(row)}`;
  if (error.code === 'CSV_QUOTE_NOT_CLOSED')
    return new UnreadableFile(
      'unusable-input',
      `${open} is never closed. Close it, or double it if it is meant.`,
    );
  if (error.code === 'CSV_MAX_RECORD_SIZE')
    return new UnreadableFile(
      'unusable-input',
      `Row ${String(row)} is longer than a million characters: a quotation mark in it is probably left open.`,
    );
  return new UnreadableFile(
    'unusable-input',
    `The file cannot be cut into rows from row ${String(row)} on: ${error.message}`,
  );
}
