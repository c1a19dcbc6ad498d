import { decimalEvidence } from '../numbers';
import { TableUnderWay, type TableFacts, type TableRow } from '../table-under-way';
import type { Place } from './addresses';
import type { WorkbookArchive } from './archive';
import type { CellSurroundings, SheetCell } from './cell-value';
import { MergedDown } from './merged-down';
import { readSheet, type SheetRow } from './read-sheet';
import type { SheetSurvey } from './sheet-survey';

export interface SheetTableFacts extends TableFacts {
  /** Cells that got the value of the merged area which they are part of. */
  readonly mergedCells: number;
  /** Filled cells right of the last heading, with the first of them. */
  readonly besides: number;
  readonly firstBeside: Place | undefined;
  /** Texts among numbers that can be read in two ways, marked so that they are not. */
  readonly marked: number;
}

/** Hands the rows of a sheet over as those of a table, by what the survey of the sheet has found. */
export async function readSheetTable(
  archive: WorkbookArchive,
  part: string,
  surroundings: CellSurroundings,
  survey: SheetSurvey,
  store: (rows: readonly TableRow[]) => Promise<void>,
): Promise<SheetTableFacts> {
  const table = new SheetTable(survey, new TableUnderWay(store));
  await readSheet(archive, part, surroundings, { row: (row) => table.row(row) });
  return table.finish();
}

/** A row of headings whose cells are merged downwards waits for the row in which they end. */
interface WaitingHeading {
  readonly row: number;
  readonly texts: ReadonlyMap<number, string>;
  readonly end: number;
}

class SheetTable {
  readonly #merged: MergedDown;
  #heading: WaitingHeading | undefined;
  #besides = 0;
  #firstBeside: Place | undefined;
  #marked = 0;

  constructor(
    private readonly survey: SheetSurvey,
    private readonly table: TableUnderWay,
  ) {
    this.#merged = new MergedDown(survey.merged);
  }

  async row(row: SheetRow): Promise<void> {
    if (row.cells.length === 0) return;
    const texts = this.#merged.textsOf(row, (cell) => this.#textOf(cell));
    if (this.table.width === undefined) await this.#above(row, texts);
    else await this.#take(row, texts);
  }

  async finish(): Promise<SheetTableFacts> {
    if (this.#heading !== undefined) await this.#takeHeading(this.#heading);
    const facts = await this.table.finish();
    return {
      ...facts,
      mergedCells: this.#merged.taken,
      besides: this.#besides,
      firstBeside: this.#firstBeside,
      marked: this.#marked,
    };
  }

  async #above(row: SheetRow, texts: ReadonlyMap<number, string>): Promise<void> {
    const waiting = this.#heading;
    if (waiting !== undefined) {
      if (row.row < waiting.end) return;
      if (row.row === waiting.end) this.table.passOver(waiting.row);
      await this.#takeHeading(row.row === waiting.end ? { ...waiting, row: row.row, texts } : waiting);
      if (row.row > waiting.end) await this.#take(row, texts);
      return;
    }
    const end = row.cells.length < 2 ? row.row : this.#merged.headingEnd(row);
    if (end > row.row) this.#heading = { row: row.row, texts, end };
    else await this.table.take(listed(row.cells.length < 2 ? ownTexts(row) : texts), row.row);
  }

  async #takeHeading({ row, texts }: WaitingHeading): Promise<void> {
    this.#heading = undefined;
    await this.table.take(listed(texts), row);
  }

  async #take(row: SheetRow, texts: ReadonlyMap<number, string>): Promise<void> {
    const width = this.table.width ?? 0;
    const besides = row.cells.filter(({ column }) => column >= width);
    this.#besides += besides.length;
    const [first] = besides;
    if (first !== undefined) this.#firstBeside ??= { row: row.row, column: first.column };
    // A row that only merged areas reach into, or only a note beside the table, is no row of it.
    if (besides.length === row.cells.length) return;
    await this.table.take(
      Array.from({ length: width }, (_, column) => texts.get(column) ?? ''),
      row.row,
    );
  }

  /** As a sheet program shows a number kept as text: with an apostrophe before it, so that it is asked about and not guessed. */
  #textOf({ column, kind, text }: SheetCell): string {
    const unclear =
      kind === 'text' && this.survey.numberColumns.has(column) && decimalEvidence(text) === 'either';
    if (unclear) this.#marked += 1;
    return unclear ? `'${text.trim()}` : text;
  }
}

function listed(texts: ReadonlyMap<number, string>): readonly string[] {
  const width = Math.max(-1, ...texts.keys()) + 1;
  return Array.from({ length: width }, (_, column) => texts.get(column) ?? '');
}

/** Above the headings only what a row holds itself counts: a merged title is one cell. */
function ownTexts({ cells }: SheetRow): ReadonlyMap<number, string> {
  return new Map(cells.map(({ column, text }) => [column, text]));
}
