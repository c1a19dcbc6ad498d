import { Readable } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import { CsvError, parse } from 'csv-parse';
import { IMPORT_LIMIT_COLUMNS, IMPORT_LIMIT_ROWS } from '#shared/contracts/imports';
import { ColumnSurvey } from './column-survey';
import { guessDelimiter, RECORD_OPTIONS, type Delimiter } from './delimiter';
import type { Encoding } from './encoding';
import { headingsOf } from './headings';
import { decimalEvidence } from './numbers';

/** A file that cannot become a table, in words for a person. */
export class UnreadableFile extends Error {
  override readonly name = 'UnreadableFile';
  constructor(
    readonly code: 'too-large' | 'unsupported-file' | 'unusable-input',
    readonly detail: string,
  ) {
    super(detail);
  }
}

export interface TableRow {
  /** Counted as a spreadsheet counts: blank rows too, the first row of the file is 1. */
  readonly rowNumber: number;
  readonly cells: readonly string[];
}

export interface TableFacts {
  readonly delimiter: Delimiter;
  readonly headings: readonly string[];
  readonly columns: readonly ColumnSurvey[];
  readonly rowCount: number;
  readonly blankLines: number;
  readonly notes: readonly string[];
}

const BEGINNING_CHARACTERS = 64 * 1024;
const BATCH_ROWS = 500;

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
): Promise<TableFacts> {
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

class TableUnderWay {
  #rowNumber = 0;
  #rowCount = 0;
  #blankLines = 0;
  #above = 0;
  #headings: readonly string[] | undefined;
  #columns: readonly ColumnSurvey[] = [];
  #notes: readonly string[] = [];
  #batch: TableRow[] = [];

  constructor(private readonly store: (rows: readonly TableRow[]) => Promise<void>) {}

  async take(record: readonly string[]): Promise<void> {
    this.#rowNumber += 1;
    const cells = record.map((cell) => cell.trim());
    const filled = cells.reduce((count, cell) => count + (cell === '' ? 0 : 1), 0);
    if (filled === 0) this.#blankLines += 1;
    else if (this.#headings === undefined) this.#takeHeading(cells, filled);
    else await this.#takeRow(cells, this.#headings.length);
  }

  #takeHeading(cells: readonly string[], filled: number): void {
    if (filled < 2) {
      this.#above += 1;
      return;
    }
    const numbers = cells.filter((cell) => decimalEvidence(cell) !== undefined).length;
    if (numbers * 2 > filled)
      throw new UnreadableFile(
        'unusable-input',
        `Row ${String(this.#rowNumber)} should name the columns, but most of its cells are numbers. Put a row of headings above the values.`,
      );
    const { names, notes } = headingsOf(cells);
    if (names.length > IMPORT_LIMIT_COLUMNS)
      throw new UnreadableFile(
        'unusable-input',
        `The file has ${String(names.length)} columns; up to ${String(IMPORT_LIMIT_COLUMNS)} can be taken.`,
      );
    this.#headings = names;
    this.#columns = names.map(() => new ColumnSurvey());
    this.#notes = notes;
  }

  async #takeRow(cells: readonly string[], width: number): Promise<void> {
    this.#rowCount += 1;
    if (this.#rowCount > IMPORT_LIMIT_ROWS) return;
    let end = cells.length;
    while (end > width && cells[end - 1] === '') end -= 1;
    const kept = end === cells.length ? cells : cells.slice(0, end);
    this.#columns.forEach((column, index) => {
      column.see(kept[index] ?? '');
    });
    this.#batch.push({ rowNumber: this.#rowNumber, cells: kept });
    if (this.#batch.length === BATCH_ROWS) await this.#flush();
  }

  async #flush(): Promise<void> {
    const batch = this.#batch;
    this.#batch = [];
    if (batch.length > 0) await this.store(batch);
  }

  async finish(): Promise<Omit<TableFacts, 'delimiter'>> {
    if (this.#headings === undefined)
      throw new UnreadableFile(
        'unusable-input',
        'No row of headings was found. The first row must name the columns, at least two of them, set apart by semicolon, comma or tab.',
      );
    if (this.#rowCount === 0)
      throw new UnreadableFile(
        'unusable-input',
        'Below the headings there is no row. Bring in a file with results in it.',
      );
    if (this.#rowCount > IMPORT_LIMIT_ROWS)
      throw new UnreadableFile(
        'too-large',
        `The file has ${String(this.#rowCount)} rows; up to ${String(IMPORT_LIMIT_ROWS)} can be taken at once. Split it and bring the parts in one after the other.`,
      );
    await this.#flush();
    return {
      headings: this.#headings,
      columns: this.#columns,
      rowCount: this.#rowCount,
      blankLines: this.#blankLines,
      notes: [
        ...(this.#above > 0 ? [`${String(this.#above)} line(s) above the headings were passed over.`] : []),
        ...this.#notes,
        ...(this.#blankLines > 0 ? [`${String(this.#blankLines)} blank line(s) were passed over.`] : []),
      ],
    };
  }
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
