import { FORMULA, type CsvCell } from './csv';

/** The looks of a cell, by their place in the styles part. */
export const STYLES = { plain: 0, heading: 1, harmless: 2 } as const;

/** What a cell holds at most (ISO/IEC 29500-1, 18.3.1.93); more is cut, with a sign that says so. */
const MOST_CHARACTERS = 32_767;
const WIDTH = { least: 9, most: 60 } as const;

/** Signs that XML cannot hold at all, lone halves of a pair among them. */
const NOT_XML = /[^\t\n\r\u0020-\ud7ff\ue000-\ufffd\u{10000}-\u{10ffff}]/gu;

/** Text for XML; what looks like the format's own escape (`_x0041_`) is escaped itself. */
export function escaped(text: string): string {
  return text
    .replace(NOT_XML, '')
    .replace(/_(?=x[0-9A-Fa-f]{4}_)/g, '_x005F_')
    .replaceAll('&', '&amp;')
    .replaceAll('<', '&lt;')
    .replaceAll('>', '&gt;')
    .replaceAll('"', '&quot;');
}

/** 0 is A, 26 is AA. */
function columnName(column: number): string {
  let name = '';
  for (let left = column + 1; left > 0; left = Math.floor((left - 1) / 26))
    name = String.fromCharCode(65 + ((left - 1) % 26)) + name;
  return name;
}

/**
 * One cell: numbers as numbers with all their digits, everything else as text. There is no way to write a formula, and
 * text that would become one when a person edits the cell is marked as text (`quotePrefix`).
 */
function cellXml(cell: CsvCell, address: string, heading: boolean): string {
  if (cell === null || cell === undefined || cell === '') return '';
  if (typeof cell === 'number')
    return Number.isFinite(cell) ? `<c r="${address}"><v>${String(cell)}</v></c>` : '';
  if (typeof cell === 'boolean') return `<c r="${address}" t="b"><v>${cell ? '1' : '0'}</v></c>`;
  const style = heading ? STYLES.heading : FORMULA.test(cell) ? STYLES.harmless : STYLES.plain;
  const text = cell.length > MOST_CHARACTERS ? `${cell.slice(0, MOST_CHARACTERS - 2)} …` : cell;
  return `<c r="${address}" t="inlineStr" s="${String(style)}"><is><t xml:space="preserve">${escaped(text)}</t></is></c>`;
}

/** A sheet with its first row fixed above the others and columns as wide as what they hold. */
export function sheetXml(rows: readonly (readonly CsvCell[])[]): string {
  const body = rows.map((row, index) => {
    const cells = row.map((cell, column) =>
      cellXml(cell, `${columnName(column)}${String(index + 1)}`, index === 0),
    );
    return `<row r="${String(index + 1)}">${cells.join('')}</row>`;
  });
  return `<?xml version="1.0" encoding="UTF-8" standalone="yes"?>
<worksheet xmlns="http://schemas.openxmlformats.org/spreadsheetml/2006/main"><sheetViews><sheetView workbookViewId="0"><pane ySplit="1" topLeftCell="A2" activePane="bottomLeft" state="frozen"/></sheetView></sheetViews>${columnsXml(rows)}<sheetData>${body.join('')}</sheetData></worksheet>`;
}

function columnsXml(rows: readonly (readonly CsvCell[])[]): string {
  const widths: number[] = [];
  for (const row of rows)
    row.forEach((cell, column) => {
      widths[column] = Math.max(widths[column] ?? WIDTH.least, String(cell ?? '').length + 1);
    });
  const columns = widths.map((width, index) => {
    const place = String(index + 1);
    return `<col min="${place}" max="${place}" width="${String(Math.min(width, WIDTH.most))}" customWidth="1"/>`;
  });
  return columns.length > 0 ? `<cols>${columns.join('')}</cols>` : '';
}
