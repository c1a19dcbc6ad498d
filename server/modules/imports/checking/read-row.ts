import type { ImportField } from '#shared/contracts/import-fields';
import type { RowReason } from '#shared/contracts/imports';
import type { Check } from '#shared/core/checks/check';
import type { CompiledMapping } from './compiled-mapping';
import { readCell, type CellValue } from './read-cell';

export interface CheckedRow {
  readonly rowNumber: number;
  readonly cells: readonly string[];
}

export interface RowValues {
  readonly row: CheckedRow;
  readonly values: ReadonlyMap<ImportField, CellValue>;
  /** The one of the four quantities that the row fills; undefined where it fills none or several. */
  readonly value: ImportField | undefined;
  readonly reasons: readonly RowReason[];
}

/** A reason to refuse a row, with the cell that is meant where the field has a column. */
export function refusal(
  mapping: CompiledMapping,
  field: ImportField | undefined,
  code: string,
  detail: string,
): RowReason {
  return { ...located(mapping, field), verdict: 'refused', code, detail };
}

/** A reason to look twice. */
export function caution(
  mapping: CompiledMapping,
  field: ImportField | undefined,
  code: string,
  detail: string,
): RowReason {
  return { ...located(mapping, field), verdict: 'cautioned', code, detail };
}

/** A check that somebody should look at, as a reason; whoever shows it finds the words. */
export function cautionOf(mapping: CompiledMapping, field: ImportField | undefined, check: Check): RowReason {
  const code = check.refusal?.code ?? check.check;
  return {
    ...located(mapping, field),
    verdict: 'cautioned',
    code: check.verdict === 'excluded' ? `stays-out:${code}` : code,
    check,
  };
}

function located(
  mapping: CompiledMapping,
  field: ImportField | undefined,
): Pick<RowReason, 'column' | 'field'> {
  const column = field === undefined ? undefined : mapping.sources.get(field)?.column;
  return { ...(column === undefined ? {} : { column }), ...(field === undefined ? {} : { field }) };
}

/** Reads every mapped cell of a row. An empty cell is a gap, never 0; a constant fills it only where there is no column. */
export function readRow(row: CheckedRow, mapping: CompiledMapping): RowValues {
  if (row.cells.length !== mapping.width) return ragged(row, mapping);
  const values = new Map<ImportField, CellValue>();
  const reasons: RowReason[] = [];
  for (const { field, column, unit, constant } of mapping.sources.values()) {
    if (column === undefined) {
      if (constant !== undefined) values.set(field, constant);
      continue;
    }
    const text = row.cells[column] ?? '';
    if (text === '') continue;
    const reading = readCell(field, text, unit, mapping.writing);
    if ('value' in reading) values.set(field, reading.value);
    else reasons.push(refusal(mapping, field, 'unreadable-cell', reading.problem));
  }
  const filled = mapping.values.filter((field) => isFilled(field, row, mapping, values));
  if (filled.length > 1) {
    const cells = filled.map((field) => `“${headingOf(field, mapping)}”`).join(' and ');
    reasons.push(
      refusal(
        mapping,
        filled[1],
        'two-quantities',
        `${cells} are both filled, and either decides what was measured. Leave one of them empty.`,
      ),
    );
  } else if (filled.length === 0) {
    const cells = mapping.values.map((field) => `“${headingOf(field, mapping)}”`).join(' or ');
    reasons.push(refusal(mapping, mapping.values[0], 'missing-input', `No drag in this row: fill ${cells}.`));
  }
  return { row, values, value: filled.length === 1 ? filled[0] : undefined, reasons };
}

function isFilled(
  field: ImportField,
  row: CheckedRow,
  mapping: CompiledMapping,
  values: ReadonlyMap<ImportField, CellValue>,
): boolean {
  const column = mapping.sources.get(field)?.column;
  return values.has(field) || (column !== undefined && (row.cells[column] ?? '') !== '');
}

export function headingOf(field: ImportField, mapping: CompiledMapping): string {
  const column = mapping.sources.get(field)?.column;
  return (column === undefined ? undefined : mapping.headings[column]) ?? 'value for all rows';
}

function ragged(row: CheckedRow, mapping: CompiledMapping): RowValues {
  const has = row.cells.length;
  const detail =
    has < mapping.width
      ? `This row has ${String(has)} cells and the headings are ${String(mapping.width)}: it ends after “${mapping.headings[has - 1] ?? ''}”. Fill what is missing, leaving empty cells where there is nothing.`
      : `This row has ${String(has)} cells and the headings are ${String(mapping.width)}. A text with the separator in it needs quotation marks; mend the row in the file, or skip it.`;
  return {
    row,
    values: new Map(),
    value: undefined,
    reasons: [refusal(mapping, undefined, 'ragged-row', detail)],
  };
}
