import type { MergedArea, SheetRow } from './read-sheet';

/**
 * A merged area belongs to its first cell; a table needs that cell's value in each of the rows beside it. It is taken
 * down the area's first column only: what is merged across is the heading of several columns, or a title, and no value
 * of a second column.
 */
export class MergedDown {
  readonly #areas: readonly MergedArea[];
  #next = 0;
  readonly #open = new Map<number, { readonly to: number; readonly text: string }>();
  #taken = 0;

  constructor(merged: readonly MergedArea[]) {
    this.#areas = merged
      .filter(({ first, last }) => last.row > first.row)
      .toSorted((one, other) => one.first.row - other.first.row);
  }

  /** How many cells have the value of their area's first cell. */
  get taken(): number {
    return this.#taken;
  }

  /** The texts of a row by column, those of merged areas with them. Rows come in their order. */
  textsOf(
    { row, cells }: SheetRow,
    textOf: (cell: SheetRow['cells'][number]) => string,
  ): Map<number, string> {
    const texts = new Map(cells.map((cell) => [cell.column, textOf(cell)]));
    for (const [column, { to, text }] of this.#open) {
      if (to < row) this.#open.delete(column);
      else if (!texts.has(column)) {
        texts.set(column, text);
        this.#taken += 1;
      }
    }
    for (let area = this.#areas[this.#next]; area !== undefined && area.first.row <= row;) {
      const text = texts.get(area.first.column);
      if (area.first.row === row && text !== undefined)
        this.#open.set(area.first.column, { to: area.last.row, text });
      this.#next += 1;
      area = this.#areas[this.#next];
    }
    return texts;
  }

  /** The last row of a heading that begins in this row and is merged downwards. */
  headingEnd({ row, cells }: SheetRow): number {
    const filled = new Set(cells.map(({ column }) => column));
    return this.#areas
      .filter(
        ({ first, last }) =>
          first.row === row && filled.has(first.column) && last.row - row <= MOST_HEADING_ROWS,
      )
      .reduce((end, { last }) => Math.max(end, last.row), row);
  }
}

/** What is merged further down than this is no heading. */
const MOST_HEADING_ROWS = 4;
