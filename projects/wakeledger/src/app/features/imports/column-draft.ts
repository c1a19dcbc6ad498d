import {
  IMPORT_FIELD_NAMES,
  importFieldRule,
  NEEDED_IMPORT_FIELDS,
  VALUE_IMPORT_FIELDS,
  type ImportField,
} from '#shared/contracts/import-fields';
import type { ImportDetail, ImportMapping } from '#shared/contracts/imports';
import { parseTypedNumber } from '../../core/numbers/parse-typed-number';

/** The columns step as it stands on the screen, before it is sent. */
export interface ColumnDraft {
  readonly decimal: ImportMapping['decimal'];
  readonly dateOrder: ImportMapping['dateOrder'];
  /** By column: the field and its unit, or nothing. */
  readonly columns: readonly { readonly field: ImportField | ''; readonly unit: string }[];
  readonly constants: readonly {
    readonly field: ImportField;
    readonly text: string;
    readonly unit: string;
  }[];
}

export const firstUnit = (field: ImportField): string => importFieldRule(field).units?.[0]?.unit ?? '';

export function draftOf(detail: ImportDetail): ColumnDraft {
  const { mapping } = detail;
  const columns = detail.columns.map(({ index }) => {
    const given = mapping.columns.find((column) => column.index === index);
    return {
      field: given?.field ?? ('' as const),
      unit: given?.unit ?? (given ? firstUnit(given.field) : ''),
    };
  });
  return {
    decimal: mapping.decimal,
    dateOrder: mapping.dateOrder,
    columns,
    constants: mapping.constants.map(({ field, text, unit }) => ({
      field,
      text,
      unit: unit ?? firstUnit(field),
    })),
  };
}

export function withColumn(draft: ColumnDraft, index: number, field: ImportField | ''): ColumnDraft {
  const columns = draft.columns.map((column, place) =>
    place === index ? { field, unit: field === '' ? '' : firstUnit(field) } : column,
  );
  return { ...draft, columns, constants: draft.constants.filter((constant) => constant.field !== field) };
}

export function withUnit(draft: ColumnDraft, index: number, unit: string): ColumnDraft {
  return {
    ...draft,
    columns: draft.columns.map((column, place) => (place === index ? { ...column, unit } : column)),
  };
}

/** Sets, changes or (with `undefined`) takes away a value for all rows. */
export function withConstant(
  draft: ColumnDraft,
  field: ImportField,
  change: { readonly text?: string; readonly unit?: string } | undefined,
): ColumnDraft {
  const others = draft.constants.filter((constant) => constant.field !== field);
  if (change === undefined) return { ...draft, constants: others };
  const before = draft.constants.find((constant) => constant.field === field);
  const fresh = { field, text: before?.text ?? '', unit: before?.unit ?? firstUnit(field), ...change };
  const constants = before
    ? draft.constants.map((constant) => (constant.field === field ? fresh : constant))
    : [...others, fresh];
  return { ...draft, constants };
}

const usesColumn = (draft: ColumnDraft, field: ImportField): boolean =>
  draft.columns.some((column) => column.field === field);

/**
 * Fields for which a value for all rows is asked: what every row needs and no column holds, what the chosen quantity
 * needs besides, and what was given already.
 */
export function askedConstants(draft: ColumnDraft): readonly ImportField[] {
  const needs: ImportField[] = [...NEEDED_IMPORT_FIELDS];
  if (usesColumn(draft, 'dragCoefficient')) needs.push('quotedArea', 'quotedAreaScale');
  if (usesColumn(draft, 'dragForce')) needs.push('tareAlreadySubtracted');
  if (usesColumn(draft, 'expandedU')) needs.push('k');
  if (!usesColumn(draft, 'temperature') && !usesColumn(draft, 'pressure')) needs.push('airState');
  if (!usesColumn(draft, 'dynamicPressure')) needs.push('speed');
  const given = draft.constants.map(({ field }) => field);
  return [...new Set([...needs, ...given])].filter((field) => !usesColumn(draft, field));
}

/** Fields that could still be given one value for all rows; what was measured never is. */
export function freeConstants(draft: ColumnDraft): readonly ImportField[] {
  const asked = askedConstants(draft);
  return IMPORT_FIELD_NAMES.filter(
    (field) => !asked.includes(field) && !usesColumn(draft, field) && !VALUE_IMPORT_FIELDS.includes(field),
  );
}

/** A number typed with a comma goes out with a point; what cannot be read goes as it is, and is refused by name. */
function plainText(field: ImportField, text: string): string {
  const { kind } = importFieldRule(field);
  if (kind !== 'number' && kind !== 'integer' && kind !== 'scale') return text.trim();
  const typed = parseTypedNumber(text);
  return typed.kind === 'number' ? String(typed.value) : text.trim();
}

export function mappingOf(draft: ColumnDraft, before: ImportMapping): ImportMapping {
  const asked = new Set(askedConstants(draft));
  return {
    ...(draft.decimal === undefined ? {} : { decimal: draft.decimal }),
    ...(draft.dateOrder === undefined ? {} : { dateOrder: draft.dateOrder }),
    columns: draft.columns.flatMap(({ field, unit }, index) =>
      field === '' ? [] : [{ index, field, ...(unit === '' ? {} : { unit }) }],
    ),
    constants: draft.constants
      .filter(({ field, text }) => asked.has(field) && text.trim() !== '')
      .map(({ field, text, unit }) => ({
        field,
        text: plainText(field, text),
        ...(unit === '' ? {} : { unit }),
      })),
    variants: before.variants,
    facilities: before.facilities,
  };
}
