import type { CsvCell } from './csv';
import { saveBlob } from './save-file';

/** A sheet to be written: the first row names the columns. */
export interface SheetToWrite {
  readonly name: string;
  readonly rows: readonly (readonly CsvCell[])[];
}

/** Hands a workbook (.xlsx) to the browser to keep. What writes it is loaded only now. */
export async function saveWorkbook(sheets: readonly SheetToWrite[], fileName: string): Promise<void> {
  const { workbookBytes, WORKBOOK_MEDIA_TYPE } = await import('./workbook-bytes');
  saveBlob(new Blob([workbookBytes(sheets)], { type: WORKBOOK_MEDIA_TYPE }), fileName);
}
