import {
  importFieldRule,
  NEEDED_IMPORT_FIELDS,
  VALUE_IMPORT_FIELDS,
  type ImportField,
} from '#shared/contracts/import-fields';
import type { ImportMapping } from '#shared/contracts/imports';
import { Issues, type Issue } from '../../../rules/issue';
import { readCell, type CellValue, type Writing } from './read-cell';

/** Where a field's text comes from: a column, or one value for all rows. */
export interface Source {
  readonly field: ImportField;
  readonly column: number | undefined;
  readonly unit: string | undefined;
  readonly constant: CellValue | undefined;
}

export interface CompiledMapping {
  readonly sources: ReadonlyMap<ImportField, Source>;
  readonly values: readonly ImportField[];
  readonly writing: Writing;
  readonly width: number;
  readonly headings: readonly string[];
}

/** What the file itself leaves open. */
export interface OpenQuestions {
  readonly decimal: boolean;
  readonly dateOrder: boolean;
}

/** A constant is typed into a form, not found in a file: numbers have a point, dates are `YYYY-MM-DD`. */
const PLAINLY: Writing = { decimal: 'point', dateOrder: 'year-month-day', asked: false };

/** What stops a mapping from being used, field by field; empty when rows can be checked by it. */
export function mappingIssues(
  mapping: ImportMapping,
  headings: readonly string[],
  open: OpenQuestions,
): readonly Issue[] {
  const issues = new Issues();
  const places = new Map<ImportField, string>();
  const columns = new Set<number>();
  mapping.columns.forEach(({ index, field, unit }, position) => {
    const where = `columns.${String(position)}`;
    const heading = headings[index];
    issues
      .when(
        heading === undefined,
        where,
        `The file has no column ${String(index + 1)}; it has ${String(headings.length)}.`,
      )
      .when(columns.has(index), where, `The column “${heading ?? ''}” is given twice. Give it once.`)
      .add(fieldIssues(field, unit, where, places));
    columns.add(index);
    places.set(field, `the column “${heading ?? ''}”`);
  });
  mapping.constants.forEach(({ field, text, unit }, position) => {
    const where = `constants.${String(position)}`;
    issues.add(fieldIssues(field, unit, where, places));
    places.set(field, 'a value for all rows');
    const reading = readCell(field, text, unit, PLAINLY);
    if ('problem' in reading) issues.when(true, `${where}.text`, reading.problem);
  });
  for (const field of NEEDED_IMPORT_FIELDS)
    issues.when(
      !places.has(field),
      field,
      'Every row needs this: choose the column that holds it, or give one value for all rows.',
      'missing-input',
    );
  issues
    .when(
      !VALUE_IMPORT_FIELDS.some((field) => places.has(field)),
      'value',
      'No column holds drag. Choose the column with the coefficient, the force, the drag area or the f2 of a coastdown.',
      'missing-input',
    )
    .when(
      open.decimal && mapping.decimal === undefined,
      'decimal',
      'The numbers of this file can be read in two ways (1.234 as a thousand or as a fraction). Choose point or comma.',
      'missing-input',
    )
    .when(
      open.dateOrder &&
        mapping.dateOrder === undefined &&
        mapping.columns.some(({ field }) => field === 'testDate'),
      'dateOrder',
      'The dates of this file can be read in two ways (04/05/2026). Choose which comes first, day or month.',
      'missing-input',
    );
  return issues.list;
}

function fieldIssues(
  field: ImportField,
  unit: string | undefined,
  where: string,
  places: ReadonlyMap<ImportField, string>,
): readonly Issue[] {
  const units = importFieldRule(field).units;
  return new Issues()
    .when(
      places.has(field),
      where,
      `This is given twice: ${places.get(field) ?? ''} holds it already. Keep one of them.`,
    )
    .when(
      unit !== undefined && units?.every((known) => known.unit !== unit) !== false,
      `${where}.unit`,
      units === undefined
        ? 'This has no unit. Leave the unit out.'
        : `“${unit ?? ''}” is no unit of this. Accepted are ${units.map((known) => known.unit).join(', ')}.`,
    ).list;
}

/** Prepares a mapping without issues for reading rows. */
export function compileMapping(
  mapping: ImportMapping,
  headings: readonly string[],
  open: OpenQuestions,
): CompiledMapping {
  const sources = new Map<ImportField, Source>();
  for (const { index, field, unit } of mapping.columns)
    sources.set(field, { field, column: index, unit, constant: undefined });
  for (const { field, text, unit } of mapping.constants) {
    const reading = readCell(field, text, unit, PLAINLY);
    if ('value' in reading) sources.set(field, { field, column: undefined, unit, constant: reading.value });
  }
  return {
    sources,
    values: VALUE_IMPORT_FIELDS.filter((field) => sources.has(field)),
    writing: {
      decimal: mapping.decimal ?? 'point',
      dateOrder: mapping.dateOrder ?? 'year-month-day',
      asked: open.decimal,
    },
    width: headings.length,
    headings,
  };
}
