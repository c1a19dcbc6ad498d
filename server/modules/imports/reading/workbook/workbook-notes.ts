import { addressOf } from './addresses';
import type { SheetTableFacts } from './sheet-table';
import { runsInWords, type SheetSurvey } from './sheet-survey';
import type { WorkbookParts } from './workbook-parts';

const counted = (count: number, one: string, several: string): string =>
  count === 1 ? `One ${one}` : `${String(count)} ${several}`;

/** What a person must know of how a workbook was read: everything that is not simply the text of a cell. */
export function workbookNotes(
  parts: WorkbookParts,
  sheet: number,
  survey: SheetSurvey,
  table: SheetTableFacts,
): readonly string[] {
  const name = parts.sheets[sheet]?.name ?? '';
  const { formulas, neverCalculated, errors, beyond, hiddenRows, hiddenColumns } = survey;
  const [far] = beyond;
  const wide = survey.merged.filter(({ first, last }) => last.column > first.column).length;
  return [
    parts.sheets.length === 1
      ? `Read from the sheet “${name}” of a workbook.`
      : `Read from the sheet “${name}”, one of ${String(parts.sheets.length)} of the workbook.`,
    ...saidIf(
      formulas.count > 0,
      `${counted(formulas.count, 'cell holds a formula', 'cells hold formulas')} (${runsInWords(formulas)}): the values that were calculated last are taken, nothing is calculated here.`,
    ),
    ...saidIf(
      neverCalculated.count > 0,
      `${counted(neverCalculated.count, 'formula was', 'formulas were')} never calculated (${runsInWords(neverCalculated)}). Open the workbook, save it and bring it in again.`,
    ),
    ...saidIf(
      errors.count > 0,
      `${counted(errors.count, 'cell holds', 'cells hold')} an error instead of a value (${runsInWords(errors)}).`,
    ),
    ...saidIf(
      table.mergedCells > 0,
      `Merged cells: the value of an area’s first cell is taken for each of its rows (${counted(table.mergedCells, 'cell', 'cells')}).`,
    ),
    ...saidIf(
      wide > 0,
      `${counted(wide, 'area is', 'areas are')} merged over several columns: the value counts for the first of them.`,
    ),
    ...saidIf(parts.from1904, 'The workbook counts its dates from 1904, and they are read so.'),
    ...saidIf(
      table.marked > 0,
      `${counted(table.marked, 'number is', 'numbers are')} kept as text and can be read in two ways (1.234): an apostrophe stands before each. Correct them in the rows.`,
    ),
    ...saidIf(
      table.besides > 0,
      `${counted(table.besides, 'cell', 'cells')} beside the table, where no heading stands, ${table.besides === 1 ? 'was' : 'were'} passed over${table.firstBeside === undefined ? '' : ` (the first is ${addressOf(table.firstBeside)})`}.`,
    ),
    ...saidIf(
      far !== undefined,
      `Cells far beyond the table were passed over (the first is ${far === undefined ? '' : addressOf(far)}).`,
    ),
    ...saidIf(
      hiddenRows > 0,
      `${counted(hiddenRows, 'hidden row is', 'hidden rows are')} read like the others.`,
    ),
    ...saidIf(
      hiddenColumns > 0,
      `${counted(hiddenColumns, 'hidden column is', 'hidden columns are')} read like the others.`,
    ),
    ...saidIf(
      parts.linksToOtherWorkbooks > 0,
      `The workbook refers to ${parts.linksToOtherWorkbooks === 1 ? 'another workbook' : `${String(parts.linksToOtherWorkbooks)} other workbooks`}: the links are not followed, and what was calculated last from them is taken.`,
    ),
    ...saidIf(parts.hasDataConnections, 'The workbook has connections to other data: they are not followed.'),
    ...saidIf(parts.hasMacros, 'The workbook holds macros: they are ignored and never run.'),
  ];
}

function saidIf(holds: boolean, words: string): readonly string[] {
  return holds ? [words] : [];
}
