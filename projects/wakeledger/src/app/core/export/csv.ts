/** A cell as it is exported; null and undefined are empty. */
export type CsvCell = string | number | boolean | null | undefined;

/** Text that a spreadsheet would run as a formula, after blanks that it skips. */
export const FORMULA = /^[\s\u00a0\ufeff]*[=+\-@\t\r\uff1d\uff0b\uff0d\uff20\u2212]/u;
const NUMBER = /^-?\d+(\.\d+)?([eE][+-]?\d+)?$/;
const NEEDS_QUOTES = /[",\r\n;\t]/;

/**
 * Comma-separated text (RFC 4180, CRLF, a byte-order mark so that spreadsheets read Greek and signs as they are).
 * Numbers are plain and machine-readable. Any other text that would start a formula gets an apostrophe before it: it
 * stays readable and is never run.
 */
export function csvText(rows: readonly (readonly CsvCell[])[]): string {
  return `\ufeff${rows.map((row) => row.map(cellText).join(',')).join('\r\n')}\r\n`;
}

function cellText(cell: CsvCell): string {
  if (cell === null || cell === undefined) return '';
  if (typeof cell === 'number') return Number.isFinite(cell) ? String(cell) : '';
  if (typeof cell === 'boolean') return cell ? 'true' : 'false';
  const harmless = NUMBER.test(cell) || !FORMULA.test(cell) ? cell : `'${cell}`;
  return NEEDS_QUOTES.test(harmless) ? `"${harmless.replaceAll('"', '""')}"` : harmless;
}
