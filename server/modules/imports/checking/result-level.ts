import { IMPORT_FIELD_NAMES, importFieldRule, type ImportField } from '#shared/contracts/import-fields';
import type { RowReason } from '#shared/contracts/imports';
import type { CompiledMapping } from './compiled-mapping';
import type { CellValue } from './read-cell';
import { headingOf, refusal, type RowValues } from './read-row';

export interface ResultLevel {
  readonly values: ReadonlyMap<ImportField, CellValue>;
  readonly reasons: ReadonlyMap<number, readonly RowReason[]>;
}

const RESULT_LEVEL = IMPORT_FIELD_NAMES.filter((field) => importFieldRule(field).perPoint !== true);

/**
 * What the rows of one result say about the result as a whole. An empty cell says nothing; two different cells
 * contradict each other, and both are named. Remarks are gathered instead, because each may tell of its own point.
 */
export function resultLevelOf(rows: readonly RowValues[], mapping: CompiledMapping): ResultLevel {
  const values = new Map<ImportField, CellValue>();
  const reasons = new Map<number, RowReason[]>();
  for (const field of RESULT_LEVEL) {
    if (field === 'remark') continue;
    const first = rows.find((row) => row.values.has(field));
    const value = first?.values.get(field);
    if (first === undefined || value === undefined) continue;
    values.set(field, value);
    for (const other of rows) {
      const stated = other.values.get(field);
      if (stated === undefined || stated === value) continue;
      const list = reasons.get(other.row.rowNumber) ?? [];
      list.push(refusal(mapping, field, 'contradiction', contradiction(field, first, other, mapping)));
      reasons.set(other.row.rowNumber, list);
    }
  }
  const remarks = [...new Set(rows.flatMap((row) => row.values.get('remark') ?? []))].join('; ');
  if (remarks !== '') values.set('remark', remarks.slice(0, 4000));
  return { values, reasons };
}

function contradiction(
  field: ImportField,
  first: RowValues,
  other: RowValues,
  mapping: CompiledMapping,
): string {
  const cell = (row: RowValues): string => {
    const column = mapping.sources.get(field)?.column;
    return column === undefined ? '' : (row.row.cells[column] ?? '');
  };
  return `“${headingOf(field, mapping)}” is “${cell(first)}” in row ${String(first.row.rowNumber)} and “${cell(other)}” in row ${String(other.row.rowNumber)}, and rows of one name are one result. Make them agree, or give one of the rows another name.`;
}
