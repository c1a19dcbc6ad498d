import type { TableRow } from '../table-under-way';
import { UnreadableFile } from '../unreadable-file';
import { WorkbookArchive } from './archive';
import { sharedTexts } from './cell-texts';
import type { CellSurroundings } from './cell-value';
import { WORKBOOK_LIMITS } from './limits';
import { numberKinds } from './number-formats';
import { readSheetTable, type SheetTableFacts } from './sheet-table';
import { surveySheet, type SheetSurvey } from './sheet-survey';
import { workbookNotes } from './workbook-notes';
import { workbookParts, type SheetPart } from './workbook-parts';
import { refuseDocumentTypes } from './xml-part';

/** A sheet, for the person who chooses one. */
export interface WorkbookSheet {
  readonly name: string;
  readonly hidden: boolean;
  readonly filledRows: number;
  readonly hasTable: boolean;
}

export interface WorkbookRead extends SheetTableFacts {
  readonly sheets: readonly WorkbookSheet[];
  /** The place of the sheet that was read, from 0. */
  readonly sheet: number;
  /** Cells of the sheet that are numbers by themselves: no sign of how numbers are written as text. */
  readonly numberCells: number;
}

interface SurveyedSheet {
  readonly sheet: SheetPart;
  readonly survey: SheetSurvey;
}

/**
 * Reads a workbook (.xlsx, or .xlsm without its macros; ISO/IEC 29500): the first visible sheet with a table, or the one
 * that was chosen. Each sheet is read once to survey it and the chosen one again for its rows, as a stream.
 *
 * @throws {UnreadableFile} with words for a person
 */
export async function readWorkbook(
  content: Uint8Array,
  store: (rows: readonly TableRow[]) => Promise<void>,
  chosen: number | undefined,
  limits = WORKBOOK_LIMITS,
): Promise<WorkbookRead> {
  const archive = await WorkbookArchive.open(content, limits);
  await refuseDocumentTypes(archive);
  const parts = await workbookParts(archive);
  const surroundings: CellSurroundings = {
    shared: await sharedTexts(archive, parts.sharedStrings),
    kinds: await numberKinds(archive, parts.styles),
    from1904: parts.from1904,
  };
  const surveyed: SurveyedSheet[] = [];
  for (const sheet of parts.sheets)
    surveyed.push({ sheet, survey: await surveySheet(archive, sheet.part, surroundings) });
  const place = chosen ?? proposed(surveyed);
  const { sheet, survey } = demandTable(surveyed, place);
  const table = await readSheetTable(archive, sheet.part, surroundings, survey, store);
  return {
    ...table,
    sheets: surveyed.map((one) => ({
      name: one.sheet.name,
      hidden: one.sheet.hidden,
      filledRows: one.survey.filledRows,
      hasTable: one.survey.hasTable,
    })),
    sheet: place,
    numberCells: survey.numberCells,
    notes: [...workbookNotes(parts, place, survey, table), ...table.notes],
  };
}

/** The first with a table that is seen; else the first with one at all. */
function proposed(surveyed: readonly SurveyedSheet[]): number {
  const seen = surveyed.findIndex(({ sheet, survey }) => survey.hasTable && !sheet.hidden);
  return seen >= 0 ? seen : surveyed.findIndex(({ survey }) => survey.hasTable);
}

function demandTable(surveyed: readonly SurveyedSheet[], place: number): SurveyedSheet {
  const found = surveyed[place];
  if (found?.survey.hasTable === true) return found;
  throw new UnreadableFile(
    'unusable-input',
    found === undefined
      ? `None of the ${String(surveyed.length)} sheet(s) of this workbook holds a table: a row that names the columns, at least two of them, and rows with results below it.`
      : `The sheet “${found.sheet.name}” holds no table: a row that names the columns, at least two of them, and rows with results below it. Choose another sheet.`,
  );
}
