import type { CellClassParams, ColDef, ITooltipParams, ValueGetterParams } from 'ag-grid-community';
import { InfiniteRowModelModule, ModuleRegistry } from 'ag-grid-community';
import type { ImportDetail, ImportRow } from '#shared/contracts/imports';
import type { CheckLanguage } from '../../ui/checks/check-figures';
import { rowWords } from './reason-words';
import { VERDICT_SHAPES, VERDICT_WORDS } from './import-words';

/** Rows come page by page; only this grid needs it. */
export function registerPaging(): void {
  ModuleRegistry.registerModules([InfiniteRowModelModule]);
}

export const VERDICT_COLUMN = 'verdict';

/** A column of the file, by its place. */
export const columnId = (index: number): string => `cell-${String(index)}`;
export const placeOf = (id: string): number | undefined => {
  const place = /^cell-(\d+)$/.exec(id)?.[1];
  return place === undefined ? undefined : Number(place);
};

const isOf = (row: ImportRow | undefined, index: number, verdict: 'refused' | 'cautioned'): boolean =>
  row?.reasons.some((reason) => reason.column === index && reason.verdict === verdict) ?? false;

/** Row number, verdict and reasons first, then the file's own columns as they stand in it. */
export function rowColumns(
  detail: ImportDetail,
  language: () => CheckLanguage,
  mend: (row: ImportRow, column: number, text: string) => void,
): ColDef<ImportRow>[] {
  const editable = detail.state === 'ready';
  return [
    {
      headerName: $localize`Row`,
      colId: 'row',
      valueGetter: ({ data }) => data?.rowNumber,
      pinned: 'left',
      width: 76,
      cellClass: 'figure',
    },
    {
      headerName: $localize`Verdict`,
      colId: VERDICT_COLUMN,
      pinned: 'left',
      width: 124,
      valueGetter: ({ data }) => verdictOf(data),
      cellClassRules: {
        accepted: ({ data }) => data?.verdict === 'accepted',
        cautioned: ({ data }) => data?.verdict === 'cautioned',
        refused: ({ data }) => data?.verdict === 'refused',
      },
    },
    {
      headerName: $localize`Why`,
      colId: 'reasons',
      width: 420,
      valueGetter: ({ data }) => rowWords(data, language()),
      tooltipValueGetter: ({ data }: ITooltipParams<ImportRow>) => rowWords(data, language()),
    },
    ...detail.columns.map(({ index, header }): ColDef<ImportRow> => ({
      headerName: header,
      colId: columnId(index),
      width: 130,
      editable: ({ data }) => editable && data !== undefined && data.verdict !== 'skipped',
      valueGetter: ({ data }: ValueGetterParams<ImportRow>) => data?.cells[index] ?? '',
      // The server answers with the row as it then is: nothing is changed here before.
      valueSetter: ({ data, newValue }) => {
        mend(data, index, String(newValue ?? ''));
        return false;
      },
      tooltipValueGetter: ({ data }: ITooltipParams<ImportRow>) => rowWords(data, language(), index),
      cellClassRules: {
        'cell-refused': ({ data }: CellClassParams<ImportRow>) => isOf(data, index, 'refused'),
        'cell-cautioned': ({ data }: CellClassParams<ImportRow>) => isOf(data, index, 'cautioned'),
        'cell-fixed': ({ data }: CellClassParams<ImportRow>) => data?.fixes[String(index)] !== undefined,
      },
    })),
  ];
}

function verdictOf(row: ImportRow | undefined): string {
  if (row?.verdict === undefined) return '';
  return `${VERDICT_SHAPES[row.verdict]} ${VERDICT_WORDS[row.verdict]}`;
}
