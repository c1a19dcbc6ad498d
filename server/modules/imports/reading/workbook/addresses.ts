/** The furthest cell of a sheet is XFD1048576 (ISO/IEC 29500-1, 18.3.1.73). */
const MOST_ROWS = 1_048_576;
const MOST_COLUMNS = 16_384;

export interface Place {
  /** Counted from 1, as it is written. */
  readonly row: number;
  /** Counted from 0. */
  readonly column: number;
}

/** Reads `C12` or `$C$12`; undefined when it is no cell of a sheet. */
export function placeOf(address: string): Place | undefined {
  const parts = /^\$?([A-Za-z]{1,3})\$?(\d{1,7})$/.exec(address);
  if (parts === null) return undefined;
  const column =
    [...(parts[1] ?? '').toUpperCase()].reduce((sum, letter) => sum * 26 + letter.charCodeAt(0) - 64, 0) - 1;
  const row = Number(parts[2]);
  return row >= 1 && row <= MOST_ROWS && column < MOST_COLUMNS ? { row, column } : undefined;
}

/** 0 is A, 26 is AA. */
export function columnName(column: number): string {
  let name = '';
  for (let left = column + 1; left > 0; left = Math.floor((left - 1) / 26))
    name = String.fromCharCode(65 + ((left - 1) % 26)) + name;
  return name;
}

export function addressOf({ row, column }: Place): string {
  return `${columnName(column)}${String(row)}`;
}

export function isRowNumber(row: number): boolean {
  return Number.isInteger(row) && row >= 1 && row <= MOST_ROWS;
}
