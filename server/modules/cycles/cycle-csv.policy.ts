import { parse } from 'csv-parse/sync';
import type { SpeedUnit, TimeUnit } from '#shared/core/cycles/own-cycle';
import { Issues, type Issue } from '../../rules/issue';

/** A trace as it stands in the file, in the units that the person names. */
export interface CycleColumns {
  readonly time: readonly number[];
  readonly speed: readonly number[];
  /** Line of the file in which each row stands, counted from 1: refusals name it. */
  readonly lines: readonly number[];
}

export type CycleReading =
  | { readonly readable: true; readonly columns: CycleColumns }
  | { readonly readable: false; readonly issues: readonly Issue[] };

/** Enough to find the fault; a file of the wrong kind would otherwise answer with thousands of lines. */
const ISSUE_LIMIT = 50;
const DELIMITERS = [';', '\t', ','] as const;

interface Row {
  readonly line: number;
  readonly cells: readonly string[];
}

/**
 * Reads two columns, time and speed, from CSV text: semicolon, tab or comma between them, decimal point or (unless the
 * comma separates) decimal comma, with or without a header line, blank lines skipped.
 */
export function readCycleCsv(csv: string): CycleReading {
  const text = csv.replace(/^\uFEFF/, '');
  const delimiter = delimiterOf(text);
  const rows = rowsOf(text, delimiter);
  if (rows === undefined) {
    return unreadable('csv', 'The text is not CSV: a quotation mark is opened and not closed.');
  }
  const body = isHeader(rows[0], delimiter) ? rows.slice(1) : rows;
  if (body.length === 0) {
    return unreadable(
      'csv',
      'There is no row. Two columns are expected: time and speed, one row per moment.',
    );
  }
  return columnsOf(body, delimiter);
}

const unreadable = (where: string, detail: string): CycleReading => ({
  readable: false,
  issues: [{ where, detail }],
});

/** The separator that gives two cells in the first line; a comma only where nothing else does, for it may be decimal. */
function delimiterOf(text: string): string {
  const firstLine = text.split(/\r\n|\n|\r/).find((line) => line.trim() !== '') ?? '';
  return DELIMITERS.find((delimiter) => firstLine.includes(delimiter)) ?? ',';
}

function rowsOf(text: string, delimiter: string): readonly Row[] | undefined {
  try {
    const records = parse(text, {
      delimiter,
      relax_column_count: true,
      skip_empty_lines: true,
      trim: true,
      record_delimiter: ['\r\n', '\n', '\r'],
      on_record: (record: string[], { lines }) => [String(lines), ...record],
    });
    return records
      .map(([line = '', ...cells]) => ({ line: Number(line), cells: withoutEmptyEnd(cells) }))
      .filter((row) => row.cells.some((cell) => cell !== ''));
  } catch {
    return undefined;
  }
}

/** Spreadsheets like to end each line with a separator. */
function withoutEmptyEnd(cells: readonly string[]): readonly string[] {
  return cells.length > 2 && cells.slice(2).every((cell) => cell === '') ? cells.slice(0, 2) : cells;
}

/** A first line with words in both columns is a header; with a number in one, it is a row with a fault. */
function isHeader(row: Row | undefined, delimiter: string): boolean {
  return row !== undefined && row.cells.every((cell) => numberOf(cell, delimiter) === undefined);
}

function columnsOf(rows: readonly Row[], delimiter: string): CycleReading {
  const issues = new Issues();
  const time: number[] = [];
  const speed: number[] = [];
  const lines: number[] = [];
  for (const { line, cells } of rows) {
    if (cells.length !== 2) {
      issues.when(
        true,
        `csv line ${line}`,
        `${cells.length === 1 ? 'One column' : `${cells.length} columns`} found where two are expected: time and speed.${
          delimiter === ',' && cells.length > 2
            ? ' With decimal commas, put a semicolon between the columns.'
            : ''
        }`,
      );
      continue;
    }
    const [timeCell = '', speedCell = ''] = cells;
    const [t, v] = [numberOf(timeCell, delimiter), numberOf(speedCell, delimiter)];
    issues.when(t === undefined, `csv line ${line}, time`, notANumber(timeCell));
    issues.when(v === undefined, `csv line ${line}, speed`, notANumber(speedCell));
    if (t === undefined || v === undefined) continue;
    issues.when(v < 0, `csv line ${line}, speed`, `${speedCell} is below 0. The speed is 0 or more.`);
    issues.when(
      time.length > 0 && t <= (time.at(-1) ?? t),
      `csv line ${line}, time`,
      `${timeCell} does not come after ${time.at(-1)}. Each row needs a later time than the one before.`,
    );
    time.push(t);
    speed.push(v);
    lines.push(line);
  }
  if (issues.list.length > 0) return { readable: false, issues: shortened(issues.list) };
  return { readable: true, columns: { time, speed, lines } };
}

const notANumber = (cell: string): string =>
  cell === ''
    ? 'The cell is empty. A number is expected.'
    : `“${cell.slice(0, 40)}” is not a number. Digits with a decimal point or comma are expected, without a unit.`;

/** A plain decimal number; the typographic minus counts, thousands separators do not. */
function numberOf(cell: string, delimiter: string): number | undefined {
  const plain = cell.replace('\u2212', '-');
  const pointed = delimiter === ',' ? plain : plain.replace(',', '.');
  return /^[+-]?(\d+(\.\d*)?|\.\d+)(e[+-]?\d+)?$/i.test(pointed) ? Number(pointed) : undefined;
}

function shortened(issues: readonly Issue[]): readonly Issue[] {
  if (issues.length <= ISSUE_LIMIT) return issues;
  return [
    ...issues.slice(0, ISSUE_LIMIT),
    { where: 'csv', detail: `And ${issues.length - ISSUE_LIMIT} more of this kind.` },
  ];
}

/** Where the trace came from, in words that stay with it. */
export function sourceWords(timeUnit: TimeUnit, speedUnit: SpeedUnit, rows: number): string {
  return `Own trace, ${rows} rows in ${timeUnit} and ${speedUnit}`;
}
