import { IMPORT_LIMIT_COLUMNS, IMPORT_LIMIT_ROWS } from '#shared/contracts/imports';
import { ColumnSurvey } from './column-survey';
import { headingsOf } from './headings';
import { decimalEvidence } from './numbers';
import { UnreadableFile } from './unreadable-file';

export interface TableRow {
  /** Counted as a spreadsheet counts: blank rows too, the first row of the file is 1. */
  readonly rowNumber: number;
  readonly cells: readonly string[];
}

export interface TableFacts {
  readonly headings: readonly string[];
  readonly columns: readonly ColumnSurvey[];
  readonly rowCount: number;
  readonly blankLines: number;
  readonly notes: readonly string[];
}

const BATCH_ROWS = 500;

/** Rows on their way to the store, whether they come from text or from a sheet: finds the headings, counts, surveys columns. */
export class TableUnderWay {
  #rowNumber = 0;
  #rowCount = 0;
  #blankLines = 0;
  #above = 0;
  #headings: readonly string[] | undefined;
  #columns: readonly ColumnSurvey[] = [];
  #notes: readonly string[] = [];
  #batch: TableRow[] = [];

  constructor(private readonly store: (rows: readonly TableRow[]) => Promise<void>) {}

  /** How many columns the headings name; undefined above them. */
  get width(): number | undefined {
    return this.#headings?.length;
  }

  /** Takes the row that follows; a sheet, which leaves blank rows out, says which row it is. */
  async take(record: readonly string[], rowNumber = this.#rowNumber + 1): Promise<void> {
    this.#blankLines += rowNumber - this.#rowNumber - 1;
    this.#rowNumber = rowNumber;
    const cells = record.map((cell) => cell.trim());
    const filled = cells.reduce((count, cell) => count + (cell === '' ? 0 : 1), 0);
    if (filled === 0) this.#blankLines += 1;
    else if (this.#headings === undefined) this.#takeHeading(cells, filled);
    else await this.#takeRow(cells, this.#headings.length);
  }

  /** Counts a row above the headings that names no columns. */
  passOver(rowNumber: number): void {
    this.#blankLines += rowNumber - this.#rowNumber - 1;
    this.#rowNumber = rowNumber;
    this.#above += 1;
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

  async finish(): Promise<TableFacts> {
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
