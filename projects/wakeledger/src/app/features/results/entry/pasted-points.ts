import { parseTypedNumber } from '../../../core/numbers/parse-typed-number';

/** The columns that a pasted table may hold, in the order of the form. */
export const POINT_COLUMNS = ['yawDeg', 'value', 's', 'n', 'speedKmh', 'tareN'] as const;
export type PointColumn = (typeof POINT_COLUMNS)[number];

/** One row of points as typed: text, so that nothing is lost before it is read. */
export type TypedPoint = Readonly<Partial<Record<PointColumn, string>>>;

const HEADER_WORDS: readonly (readonly [PointColumn, RegExp])[] = [
  ['yawDeg', /yaw|beta|β|ψ|psi|schr[aä]g|angle|winkel/i],
  ['speedKmh', /speed|velocity|geschw|km\/h|^u\b|^v\b/i],
  ['tareN', /tare|tara/i],
  ['s', /^(s|σ|std|sd|stdev|standard deviation)\b/i],
  ['n', /^n\b|readings|repeats|count|anzahl/i],
  ['value', /drag|force|kraft|c_?d|c_?w|c_?x|cda|value|wert|f2|^f\b/i],
];

/**
 * A table copied from a spreadsheet (rows by line, cells by tab; semicolons where there is no tab). A first row without
 * a number is its header and decides the columns; without one they are yaw, value, s, n, speed, tare. Blank lines are
 * skipped.
 */
export function pastedPoints(text: string): readonly TypedPoint[] {
  const rows = text
    .split(/\r\n|\r|\n/)
    .map((line) => line.split(line.includes('\t') ? '\t' : ';').map((cell) => cell.trim()))
    .filter((cells) => cells.some((cell) => cell !== ''));
  const [first] = rows;
  if (first === undefined) return [];
  const hasHeader = first.every((cell) => !/\d/.test(cell) || /[a-z]{2}/i.test(cell));
  const columns = hasHeader ? columnsOf(first) : POINT_COLUMNS;
  return rows.slice(hasHeader ? 1 : 0).map((cells) => typedPoint(cells, columns));
}

/** Whether a pasted text is a table rather than one figure for one field. */
export function isTable(text: string): boolean {
  return /\t/.test(text) || /[\r\n]/.test(text.trim());
}

function columnsOf(header: readonly string[]): readonly (PointColumn | undefined)[] {
  const taken = new Set<PointColumn>();
  return header.map((cell) => {
    const found = HEADER_WORDS.find(([column, words]) => !taken.has(column) && words.test(cell))?.[0];
    if (found !== undefined) taken.add(found);
    return found;
  });
}

function typedPoint(cells: readonly string[], columns: readonly (PointColumn | undefined)[]): TypedPoint {
  const point: Partial<Record<PointColumn, string>> = {};
  cells.forEach((cell, position) => {
    const column = columns[position];
    if (column !== undefined && cell !== '') point[column] = cell;
  });
  return point;
}

export type DecimalMark = '.' | ',';

/**
 * Which mark a pasted table writes its decimals with. One cell that can be read in one way only decides for all; where
 * none does, it is unclear and has to be asked.
 */
export function decimalMarkOf(points: readonly TypedPoint[]): DecimalMark | 'either' | 'unclear' {
  let open = false;
  for (const text of points.flatMap((point) => Object.values(point))) {
    const typed = parseTypedNumber(text);
    if (typed.kind === 'ambiguous') open = true;
    if (typed.kind !== 'number' || !/[.,]/.test(text)) continue;
    const last = Math.max(text.lastIndexOf('.'), text.lastIndexOf(','));
    const isDecimal = !Number.isInteger(typed.value) || text.replace(/[^.,]/g, '').length === 1;
    const mark = text[last] === ',' ? ',' : '.';
    return isDecimal ? mark : mark === ',' ? '.' : ',';
  }
  return open ? 'unclear' : 'either';
}

/** A cell read with the mark that the table writes its decimals with; null where it is no number. */
export function readCell(text: string, mark: DecimalMark | 'either'): number | null {
  const typed = parseTypedNumber(text);
  if (typed.kind === 'number') return typed.value;
  if (typed.kind !== 'ambiguous') return null;
  const decimalMeant = mark === 'either' || text.includes(mark);
  return decimalMeant ? typed.readings.decimal : typed.readings.grouped;
}
