import { CSP_NONCE, inject } from '@angular/core';
import {
  CellApiModule,
  CellStyleModule,
  ClientSideRowModelApiModule,
  ClientSideRowModelModule,
  ColumnApiModule,
  ColumnAutoSizeModule,
  CsvExportModule,
  CustomEditorModule,
  DateFilterModule,
  EventApiModule,
  ExternalFilterModule,
  GridStateModule,
  type GridOptions,
  LocaleModule,
  ModuleRegistry,
  NumberEditorModule,
  NumberFilterModule,
  QuickFilterModule,
  RenderApiModule,
  RowApiModule,
  RowAutoHeightModule,
  RowSelectionModule,
  RowStyleModule,
  ScrollApiModule,
  SelectEditorModule,
  TextEditorModule,
  TextFilterModule,
  TooltipModule,
  ValidationModule,
} from 'ag-grid-community';
import { gridTheme } from '../../../theme/grid-theme';

declare const ngDevMode: unknown;

let registered = false;

function registerParts(): void {
  if (registered) return;
  registered = true;
  ModuleRegistry.registerModules([
    CellApiModule,
    CellStyleModule,
    ClientSideRowModelApiModule,
    ClientSideRowModelModule,
    ColumnApiModule,
    ColumnAutoSizeModule,
    CsvExportModule,
    CustomEditorModule,
    DateFilterModule,
    EventApiModule,
    ExternalFilterModule,
    GridStateModule,
    LocaleModule,
    NumberEditorModule,
    NumberFilterModule,
    QuickFilterModule,
    RenderApiModule,
    RowApiModule,
    RowAutoHeightModule,
    RowSelectionModule,
    RowStyleModule,
    ScrollApiModule,
    SelectEditorModule,
    TextEditorModule,
    TextFilterModule,
    TooltipModule,
  ]);
  // Explains wrong options; half a megabyte that only development needs.
  if (typeof ngDevMode === 'undefined' || ngDevMode) ModuleRegistry.registerModules([ValidationModule]);
}

/**
 * What every data grid of the product begins with: our theme, the page's nonce for its styles, no animation. Call it in
 * an injection context of a lazily loaded page and spread it into the page's own options.
 */
export function gridDefaults<Row>(): GridOptions<Row> {
  registerParts();
  return {
    theme: gridTheme,
    styleNonce: inject(CSP_NONCE, { optional: true }) ?? undefined,
    animateRows: false,
    suppressCellFocus: false,
    enableCellTextSelection: true,
    ensureDomOrder: true,
    suppressColumnVirtualisation: false,
    defaultColDef: { sortable: true, resizable: true, suppressHeaderMenuButton: false },
  };
}
