import { IMPORT_LIMIT_COLUMNS } from '#shared/contracts/imports';
import { isRowNumber, placeOf, type Place } from './addresses';
import type { WorkbookArchive } from './archive';
import { RichText } from './cell-texts';
import { cellValue, type CellSurroundings, type SheetCell } from './cell-value';
import { damaged } from './limits';
import { readXml } from './xml-part';

/** A row with at least one cell that is not empty. */
export interface SheetRow {
  readonly row: number;
  readonly hidden: boolean;
  /** From left to right, without the empty ones, within the columns that an import can take. */
  readonly cells: readonly SheetCell[];
  /** The filled cells beyond those columns. */
  readonly beyond: readonly Place[];
}

export interface MergedArea {
  readonly first: Place;
  readonly last: Place;
}

export interface SheetListener {
  readonly row: (row: SheetRow) => void | Promise<void>;
  readonly merged?: (area: MergedArea) => void;
  readonly hiddenColumns?: (count: number) => void;
}

/** Of cells beyond the last column that can be taken, a row keeps only so many places. */
const MOST_BEYOND = 3;

interface RowUnderWay {
  readonly row: number;
  readonly hidden: boolean;
  readonly cells: SheetCell[];
  readonly beyond: Place[];
  column: number;
}

interface CellUnderWay {
  readonly place: Place;
  readonly type: string;
  readonly style: number;
  formula: boolean;
  value: string | undefined;
  inline: string;
}

/**
 * Reads the cells of a sheet, row by row in one pass: memory holds the rows of one piece of the part, however far away a
 * cell stands.
 *
 * @throws {UnreadableFile} when rows or cells are out of order or outside of any sheet
 */
export async function readSheet(
  archive: WorkbookArchive,
  part: string,
  surroundings: CellSurroundings,
  listener: SheetListener,
): Promise<void> {
  const reader = new SheetReader(surroundings, listener);
  await readXml(archive, part, {
    open: (element, attributes) => reader.open(element, attributes),
    text: (text) => reader.text(text),
    close: (element) => reader.close(element),
    piece: () => reader.handOn(),
  });
  await reader.handOn();
}

class SheetReader {
  #lastRow = 0;
  #row: RowUnderWay | undefined;
  #cell: CellUnderWay | undefined;
  #inside: string | undefined;
  readonly #inline = new RichText();
  #waiting: SheetRow[] = [];

  constructor(
    private readonly surroundings: CellSurroundings,
    private readonly listener: SheetListener,
  ) {}

  open(element: string, attributes: Readonly<Record<string, string>>): void {
    if (element === 'row') this.#openRow(attributes);
    else if (element === 'c') this.#openCell(attributes);
    else if (element === 'mergeCell') this.#merge(attributes['ref'] ?? '');
    else if (element === 'col' && isTrue(attributes['hidden'])) this.#hiddenColumns(attributes);
    else if (this.#cell !== undefined) {
      if (element === 'f') this.#cell.formula = true;
      if (element === 'v') this.#cell.value ??= '';
      this.#inside = element;
      if (this.#cell.type === 'inlineStr') this.#inline.open(element);
    }
  }

  text(text: string): void {
    if (this.#cell === undefined) return;
    if (this.#inside === 'v') this.#cell.value = (this.#cell.value ?? '') + text;
    else if (this.#cell.type === 'inlineStr') this.#inline.add(text);
  }

  close(element: string): void {
    if (element === 'row') this.#closeRow();
    else if (element === 'c') this.#closeCell();
    else if (this.#cell !== undefined) {
      this.#inside = undefined;
      if (this.#cell.type === 'inlineStr') this.#inline.close(element);
    }
  }

  async handOn(): Promise<void> {
    const rows = this.#waiting;
    this.#waiting = [];
    for (const row of rows) await this.listener.row(row);
  }

  #openRow(attributes: Readonly<Record<string, string>>): void {
    const stated = attributes['r'];
    const row = stated === undefined ? this.#lastRow + 1 : Number(stated);
    if (!isRowNumber(row))
      throw damaged(`it has a row ${String(stated ?? row).slice(0, 12)}, which no sheet has.`);
    if (row <= this.#lastRow)
      throw damaged(`its row ${String(row)} follows row ${String(this.#lastRow)}; rows must rise.`);
    this.#lastRow = row;
    this.#row = { row, hidden: isTrue(attributes['hidden']), cells: [], beyond: [], column: -1 };
  }

  #openCell(attributes: Readonly<Record<string, string>>): void {
    const row = this.#row;
    if (row === undefined) return;
    const stated = attributes['r'];
    const place = stated === undefined ? { row: row.row, column: row.column + 1 } : placeOf(stated);
    if (place?.row !== row.row)
      throw damaged(
        `row ${String(row.row)} holds a cell ${String(stated).slice(0, 12)}, which cannot be there.`,
      );
    if (place.column <= row.column)
      throw damaged(`in row ${String(row.row)} the cells do not follow each other.`);
    row.column = place.column;
    this.#cell = {
      place,
      type: attributes['t'] ?? 'n',
      style: Number(attributes['s'] ?? 0),
      formula: false,
      value: undefined,
      inline: '',
    };
  }

  #closeCell(): void {
    const cell = this.#cell;
    const row = this.#row;
    this.#cell = undefined;
    if (cell === undefined || row === undefined) return;
    if (cell.type === 'inlineStr') cell.inline = this.#inline.take();
    const read = cellValue(cell, this.surroundings);
    if (read === undefined) return;
    if (read.column < IMPORT_LIMIT_COLUMNS) row.cells.push(read);
    else if (row.beyond.length < MOST_BEYOND) row.beyond.push(cell.place);
  }

  #closeRow(): void {
    const row = this.#row;
    this.#row = undefined;
    if (row !== undefined && row.cells.length + row.beyond.length > 0) this.#waiting.push(row);
  }

  #merge(reference: string): void {
    const [from, to] = reference.split(':').map(placeOf);
    if (from === undefined || to === undefined || to.row < from.row || to.column < from.column) return;
    this.listener.merged?.({ first: from, last: to });
  }

  #hiddenColumns(attributes: Readonly<Record<string, string>>): void {
    const from = Number(attributes['min'] ?? 0);
    const to = Math.min(Number(attributes['max'] ?? from), IMPORT_LIMIT_COLUMNS);
    if (to >= from) this.listener.hiddenColumns?.(to - from + 1);
  }
}

function isTrue(text: string | undefined): boolean {
  return text === '1' || text === 'true';
}
