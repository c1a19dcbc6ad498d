import * as z from 'zod';
import { resultCheck } from './checks';
import { id, name, notNegative, positive, timestamp, version } from './common';
import { IMPORT_FIELD_NAMES } from './import-fields';
import { BODY_SHAPES } from './variants';

export const IMPORT_LIMIT_BYTES = 25 * 1024 * 1024;
export const IMPORT_LIMIT_ROWS = 20_000;
export const IMPORT_LIMIT_COLUMNS = 200;
export const IMPORT_PAGE_ROWS = 500;

/**
 * Where an import stands. The screen's step follows from it: `mapping` the columns, `checking` runs, `ready` to look at
 * rows and confirm, `storing` runs, `stored`. `cancelled`: laid aside before it was stored.
 */
export const IMPORT_STATES = [
  'mapping',
  'checking',
  'ready',
  'storing',
  'stored',
  'withdrawn',
  'cancelled',
  'failed',
] as const;
export type ImportState = (typeof IMPORT_STATES)[number];

export const ENCODINGS = ['utf-8', 'utf-16le', 'utf-16be', 'windows-1252'] as const;
export const DELIMITERS = [';', ',', '\t'] as const;
export const DECIMALS = ['point', 'comma'] as const;
/** Order of day, month and year: 2026-05-04, 04.05.2026 (or with / or -), 05/04/2026. */
export const DATE_ORDERS = ['year-month-day', 'day-month-year', 'month-day-year'] as const;
export const VERDICTS = ['accepted', 'cautioned', 'refused', 'skipped'] as const;
export type Verdict = (typeof VERDICTS)[number];

const field = z.enum(IMPORT_FIELD_NAMES);
const columnIndex = z.int().min(0).max(IMPORT_LIMIT_COLUMNS);
const cellText = z.string().max(4000);

/** A column as the file has it, with what it probably means. */
export const importColumn = z.strictObject({
  index: columnIndex,
  /** Unique: a repeated heading carries its number, an empty one its position. */
  header: z.string(),
  samples: z.array(z.string()).describe('The first few different cells that are not empty'),
  guessedField: field.optional(),
  guessedUnit: z.string().optional(),
});
export type ImportColumn = z.infer<typeof importColumn>;

/** What becomes of a variant's name in the file that the programme does not know. */
export const variantChoice = z.discriminatedUnion('action', [
  z.strictObject({
    action: z.literal('match'),
    text: z.string(),
    variantId: id.describe('The name is remembered as an alias of this variant'),
  }),
  z.strictObject({
    action: z.literal('create'),
    text: z.string(),
    name,
    bodyShape: z.enum(BODY_SHAPES),
    frontalAreaM2: positive.max(20),
    frontalAreaUM2: notNegative.max(1).optional(),
    massKg: positive.max(60000).optional(),
    rollingResistance: positive.max(0.1).optional(),
  }),
  z.strictObject({ action: z.literal('skip'), text: z.string() }),
]);
export type VariantChoice = z.infer<typeof variantChoice>;

export const importMapping = z.strictObject({
  decimal: z.enum(DECIMALS).optional().describe('Absent: the file leaves it open, and it is asked'),
  dateOrder: z.enum(DATE_ORDERS).optional(),
  columns: z
    .array(z.strictObject({ index: columnIndex, field, unit: z.string().max(20).optional() }))
    .max(IMPORT_LIMIT_COLUMNS),
  /** A value for all rows, where no column holds the field; numbers with a decimal point. */
  constants: z
    .array(
      z.strictObject({ field, text: z.string().trim().min(1).max(400), unit: z.string().max(20).optional() }),
    )
    .max(60),
  variants: z.array(variantChoice).max(2000),
  facilities: z.array(z.strictObject({ text: z.string(), facilityId: id })).max(500),
});
export type ImportMapping = z.infer<typeof importMapping>;

export const verdictCounts = z.strictObject({
  accepted: z.int(),
  cautioned: z.int(),
  refused: z.int(),
  skipped: z.int(),
});

export const importSummary = z.strictObject({
  id,
  version,
  programmeId: id,
  fileName: z.string(),
  sizeBytes: z.int(),
  state: z.enum(IMPORT_STATES),
  rowCount: z.int(),
  counts: verdictCounts.describe('All 0 before the first check'),
  resultCount: z.int().describe('Results that were stored'),
  createdAt: timestamp,
  createdBy: name,
  /** Why it failed or was withdrawn. */
  message: z.string().optional(),
});
export type ImportSummary = z.infer<typeof importSummary>;

/** A sheet of a workbook, for the person who chooses one. */
export const importSheet = z.strictObject({
  name: z.string(),
  hidden: z.boolean(),
  filledRows: z.int(),
  hasTable: z.boolean().describe('A row of headings with rows below it: such a sheet can be read'),
});

export const importDetail = importSummary.extend({
  sha256: z.string(),
  encoding: z.enum(ENCODINGS).optional().describe('Of a file of text'),
  delimiter: z.enum(DELIMITERS).optional().describe('Of a file of text'),
  sheets: z.array(importSheet).optional().describe('Of a workbook, in its order'),
  sheet: z.int().min(0).optional().describe('Of a workbook: the place of the sheet that was read'),
  /** What the numbers of the file show; `ambiguous` is asked. Absent: no number shows any. */
  decimalFound: z.enum([...DECIMALS, 'ambiguous']).optional(),
  dateOrderFound: z.enum([...DATE_ORDERS, 'ambiguous']).optional(),
  blankLines: z.int(),
  /** What was noticed while reading, in words: the encoding, formulas and merged cells, repeated headings, blank lines. */
  notes: z.array(z.string()),
  columns: z.array(importColumn),
  mapping: importMapping.describe('As confirmed last; before that, as guessed or remembered'),
  mappingRemembered: z.boolean(),
  /** Names in the file that are not known, with the number of rows and the likeliest match. */
  unknownVariants: z.array(z.strictObject({ text: z.string(), rows: z.int(), suggestedId: id.optional() })),
  unknownFacilities: z.array(z.strictObject({ text: z.string(), rows: z.int(), suggestedId: id.optional() })),
  /** What confirming would store. */
  willStore: z.strictObject({ results: z.int(), points: z.int(), variants: z.int(), aliases: z.int() }),
  progress: z.strictObject({ done: z.int(), total: z.int(), words: z.string() }).optional(),
  /** The same bytes were brought in before. */
  sameFileAs: z
    .strictObject({
      importId: id,
      programmeId: id,
      state: z.enum(IMPORT_STATES),
      createdAt: timestamp,
      createdBy: name,
    })
    .optional(),
});
export type ImportDetail = z.infer<typeof importDetail>;

const reasonPlace = {
  verdict: z.enum(['cautioned', 'refused']),
  code: z.string(),
  column: columnIndex.optional(),
  field: field.optional(),
};

/**
 * One reason for a verdict: the cell that is meant, and words that say what would be accepted; or a check of the result,
 * which the client words as it does everywhere else.
 */
export const rowReason = z.union([
  z.strictObject({ ...reasonPlace, detail: z.string() }),
  z.strictObject({ ...reasonPlace, check: resultCheck }),
]);
export type RowReason = z.infer<typeof rowReason>;

export const importRow = z.strictObject({
  rowNumber: z.int().describe('Line of the record in the file as a table: the heading is row 1'),
  cells: z.array(z.string()),
  verdict: z.enum(VERDICTS).optional(),
  reasons: z.array(rowReason),
  /** Column index → what the file had there before it was fixed. */
  fixes: z.record(z.string(), z.string()),
});
export type ImportRow = z.infer<typeof importRow>;

export const rowFilter = z.strictObject({
  verdict: z.enum(VERDICTS).optional(),
  search: z.string().max(200).optional(),
  /** Rows with a reason in this column; with `search`, the column that is searched. */
  column: columnIndex.optional(),
});
export type RowFilter = z.infer<typeof rowFilter>;

/** One correction, of one cell or of many rows at once. */
export const importFix = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('cell'), rowNumber: z.int(), column: columnIndex, text: cellText }),
  z.strictObject({ kind: z.literal('set'), column: columnIndex, text: cellText, filter: rowFilter }),
  z.strictObject({
    kind: z.literal('replace'),
    column: columnIndex,
    find: z.string().min(1).max(200),
    text: cellText,
    filter: rowFilter,
  }),
  z.strictObject({
    kind: z.literal('skip'),
    filter: rowFilter,
    rowNumbers: z.array(z.int()).max(1000).optional(),
  }),
  z.strictObject({
    kind: z.literal('unskip'),
    filter: rowFilter,
    rowNumbers: z.array(z.int()).max(1000).optional(),
  }),
]);
export type ImportFix = z.infer<typeof importFix>;
