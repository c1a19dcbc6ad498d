import { columnName, type Place } from './addresses';
import type { WorkbookArchive } from './archive';
import { NEVER_CALCULATED, type CellSurroundings, type SheetCell } from './cell-value';
import { UnreadableFile } from '../unreadable-file';
import { readSheet, type MergedArea, type SheetRow } from './read-sheet';

/** A run of cells below each other. */
export interface CellRun {
  readonly column: number;
  readonly from: number;
  readonly to: number;
}

export interface Gathered {
  readonly count: number;
  readonly runs: readonly CellRun[];
}

/** Everything that is found out about a sheet in a first pass, because a sheet says much of it behind its cells. */
export interface SheetSurvey {
  readonly filledRows: number;
  /** The first row with two filled cells or more, most of them no numbers, has a filled row below it. */
  readonly hasTable: boolean;
  readonly merged: readonly MergedArea[];
  readonly formulas: Gathered;
  readonly neverCalculated: Gathered;
  readonly errors: Gathered;
  readonly beyond: readonly Place[];
  readonly hiddenRows: number;
  readonly hiddenColumns: number;
  readonly numberCells: number;
  /** Columns with more numbers than texts. */
  readonly numberColumns: ReadonlySet<number>;
}

const MOST_RUNS = 200;

/** Cells of one kind, as runs down the columns. */
class Runs {
  #count = 0;
  readonly #runs: { readonly column: number; readonly from: number; to: number }[] = [];
  readonly #open = new Map<number, { readonly column: number; readonly from: number; to: number }>();

  add(column: number, row: number): void {
    this.#count += 1;
    const open = this.#open.get(column);
    if (open !== undefined && open.to === row - 1) {
      open.to = row;
      return;
    }
    const run = { column, from: row, to: row };
    this.#open.set(column, run);
    if (this.#runs.length < MOST_RUNS) this.#runs.push(run);
  }

  get gathered(): Gathered {
    return { count: this.#count, runs: this.#runs };
  }
}

/** `C2:C13`, `D7`; where there are many, the first ones. */
export function runsInWords({ runs }: Gathered, most = 4): string {
  const shown = runs.slice(0, most).map(({ column, from, to }) => {
    const name = columnName(column);
    return from === to ? `${name}${String(from)}` : `${name}${String(from)}:${name}${String(to)}`;
  });
  return runs.length > most ? `${shown.join(', ')} and more` : shown.join(', ');
}

export async function surveySheet(
  archive: WorkbookArchive,
  part: string,
  surroundings: CellSurroundings,
): Promise<SheetSurvey> {
  const survey = new SurveyUnderWay(archive.limits.mergedAreas);
  await readSheet(archive, part, surroundings, {
    row: (row) => survey.row(row),
    merged: (area) => survey.merge(area),
    hiddenColumns: (count) => {
      survey.hiddenColumns += count;
    },
  });
  return survey.result;
}

class SurveyUnderWay {
  hiddenColumns = 0;
  #filledRows = 0;
  #heading: 'none yet' | 'found' | 'numbers' = 'none yet';
  #rowsBelow = 0;
  #hiddenRows = 0;
  #numberCells = 0;
  readonly #merged: MergedArea[] = [];
  readonly #formulas = new Runs();
  readonly #neverCalculated = new Runs();
  readonly #errors = new Runs();
  readonly #beyond: Place[] = [];
  readonly #numbersOver = new Map<number, number>();

  constructor(private readonly mostMerged: number) {}

  row({ row, hidden, cells, beyond }: SheetRow): void {
    if (this.#beyond.length < 3) this.#beyond.push(...beyond.slice(0, 1));
    if (cells.length === 0) return;
    this.#filledRows += 1;
    if (hidden) this.#hiddenRows += 1;
    if (this.#heading === 'found') this.#rowsBelow += 1;
    if (this.#heading === 'none yet' && cells.length >= 2) {
      const numbers = cells.filter(({ kind }) => kind === 'number').length;
      this.#heading = numbers * 2 > cells.length ? 'numbers' : 'found';
    }
    for (const cell of cells) this.#cell(cell, row);
  }

  merge(area: MergedArea): void {
    this.#merged.push(area);
    if (this.#merged.length > this.mostMerged)
      throw new UnreadableFile(
        'too-large',
        `A sheet has more than ${String(this.mostMerged)} merged areas. Take the merging off, save the workbook and bring that in.`,
      );
  }

  #cell({ column, kind, text, formula }: SheetCell, row: number): void {
    if (text === NEVER_CALCULATED) this.#neverCalculated.add(column, row);
    else if (formula) this.#formulas.add(column, row);
    if (kind === 'error' && text !== NEVER_CALCULATED) this.#errors.add(column, row);
    if (kind === 'number') this.#numberCells += 1;
    if (kind === 'number' || kind === 'text')
      this.#numbersOver.set(column, (this.#numbersOver.get(column) ?? 0) + (kind === 'number' ? 1 : -1));
  }

  get result(): SheetSurvey {
    return {
      filledRows: this.#filledRows,
      hasTable: this.#heading === 'found' && this.#rowsBelow > 0,
      merged: this.#merged,
      formulas: this.#formulas.gathered,
      neverCalculated: this.#neverCalculated.gathered,
      errors: this.#errors.gathered,
      beyond: this.#beyond,
      hiddenRows: this.#hiddenRows,
      hiddenColumns: this.hiddenColumns,
      numberCells: this.#numberCells,
      numberColumns: new Set([...this.#numbersOver].filter(([, over]) => over > 0).map(([column]) => column)),
    };
  }
}
