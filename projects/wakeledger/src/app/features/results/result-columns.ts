import type { ColDef, ICellRendererParams, IHeaderComp } from 'ag-grid-community';
import type { QuantityFormat } from '../../ui/quantity/quantity-format';
import { STATE_SHAPES, STATE_WORDS } from './page/state-words';
import { CHECK_INKS, CHECK_SHAPES, CHECK_WORDS } from './result-check';
import type { ResultRow } from './result-rows';

/** The head of the drag area's column: its subscript is a true one. */
class DragAreaHead implements IHeaderComp {
  private readonly head = document.createElement('span');

  init(): void {
    this.head.append('C', element('sub', 'D'), $localize`·A at the reference, m²`);
  }

  getGui(): HTMLElement {
    return this.head;
  }

  refresh(): boolean {
    return true;
  }
}

/** The grid's columns. Cells are drawn as elements, without styles of their own: the page's policy allows none. */
export function resultColumns(
  format: QuantityFormat,
  addressOf: (row: ResultRow) => string,
): ColDef<ResultRow>[] {
  const speed = format.display('speed');
  const number = {
    type: 'rightAligned',
    filter: 'agNumberColumnFilter',
    cellClass: 'figure',
  } as const;
  return [
    {
      field: 'name',
      headerName: $localize`Result`,
      filter: 'agTextColumnFilter',
      width: 150,
      cellRenderer: (params: ICellRendererParams<ResultRow>) => link(params, addressOf),
    },
    { field: 'variant', headerName: $localize`Variant`, filter: 'agTextColumnFilter', width: 170 },
    { field: 'facility', headerName: $localize`Facility`, filter: 'agTextColumnFilter', width: 190 },
    { field: 'testDate', headerName: $localize`Tested`, filter: 'agTextColumnFilter', width: 115 },
    {
      field: 'check',
      headerName: $localize`Check`,
      width: 130,
      filter: 'agTextColumnFilter',
      valueGetter: ({ data }) => (data ? CHECK_WORDS[data.check.state] : ''),
      cellRenderer: checkCell,
    },
    {
      field: 'dragAreaM2',
      headerName: $localize`C_D·A at the reference, m²`,
      headerComponentParams: { innerHeaderComponent: DragAreaHead },
      ...number,
      width: 215,
      cellRenderer: (params: ICellRendererParams<ResultRow>) => figureCell(params, format),
    },
    { field: 'quantity', headerName: $localize`Quantity`, filter: 'agTextColumnFilter', width: 140 },
    {
      field: 'value',
      headerName: $localize`Value as it came`,
      ...number,
      width: 160,
      valueFormatter: ({ data }) => rawText(data, format),
    },
    {
      field: 'speedKmh',
      headerName: $localize`Speed, ${speed.unit}:UNIT:`,
      ...number,
      width: 110,
      valueFormatter: ({ value }) =>
        typeof value === 'number' ? format.value(value, 'speed', { withUnit: false }) : '–',
    },
    {
      field: 'scale',
      headerName: $localize`Scale`,
      ...number,
      width: 90,
      valueFormatter: ({ value }) => (typeof value === 'number' ? format.text(value * 100, 'percent') : ''),
    },
    { field: 'angles', headerName: $localize`Yaw angles`, ...number, width: 110 },
    {
      field: 'state',
      headerName: $localize`State`,
      width: 130,
      filter: 'agTextColumnFilter',
      valueGetter: ({ data }) => (data ? STATE_WORDS[data.state] : ''),
      cellRenderer: stateCell,
    },
    { field: 'session', headerName: $localize`Session`, filter: 'agTextColumnFilter', width: 130 },
    {
      colId: 'why',
      headerName: $localize`Why`,
      filter: 'agTextColumnFilter',
      width: 420,
      valueGetter: ({ data }) => data?.check.reasons.join(' ') ?? '',
      tooltipValueGetter: ({ data }) => data?.check.reasons.join(' ') ?? '',
    },
  ];
}

/** The digits that the value came with; its unit in the person's marks beside it. */
export function rawText(row: Pick<ResultRow, 'value' | 'unit'> | undefined, format: QuantityFormat): string {
  if (!row || row.value === null) return '–';
  const digits = Math.min(8, (String(row.value).split('.')[1] ?? '').length);
  const text = format.value(row.value, 'number', { digits });
  return row.unit === '' ? text : `${text}\u202f${row.unit}`;
}

function element(tag: string, text: string, className = ''): HTMLElement {
  const made = document.createElement(tag);
  made.textContent = text;
  if (className !== '') made.className = className;
  return made;
}

function link(
  { data, value }: ICellRendererParams<ResultRow>,
  addressOf: (row: ResultRow) => string,
): HTMLElement {
  const anchor = document.createElement('a');
  anchor.textContent = String(value ?? '');
  if (data) anchor.href = addressOf(data);
  // The grid moves its own focus from cell to cell; Enter opens.
  anchor.tabIndex = -1;
  return anchor;
}

function checkCell({ data }: ICellRendererParams<ResultRow>): HTMLElement {
  const state = data?.check.state ?? 'unknown';
  const cell = element('span', '', CHECK_INKS[state]);
  const shape = element('span', `${CHECK_SHAPES[state]} `);
  shape.setAttribute('aria-hidden', 'true');
  cell.append(shape, CHECK_WORDS[state]);
  return cell;
}

function figureCell({ data }: ICellRendererParams<ResultRow>, format: QuantityFormat): HTMLElement {
  const cell = document.createElement('span');
  if (!data || data.dragAreaM2 === null || data.expandedUM2 === null) {
    cell.textContent = '–';
    return cell;
  }
  cell.append(
    format.value(data.dragAreaM2, 'drag-area'),
    element('small', `\u00a0±\u00a0${format.value(data.expandedUM2, 'drag-area')}`),
  );
  return cell;
}

function stateCell({ data }: ICellRendererParams<ResultRow>): HTMLElement {
  const state = data?.state ?? 'entered';
  const cell = element('span', '', state === 'adopted' ? 'wl-moss' : '');
  const shape = element('span', `${STATE_SHAPES[state]} `);
  shape.setAttribute('aria-hidden', 'true');
  cell.append(shape, STATE_WORDS[state]);
  return cell;
}
