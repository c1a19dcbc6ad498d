import {
  ChangeDetectionStrategy,
  Component,
  Injector,
  computed,
  effect,
  inject,
  input,
  runInInjectionContext,
  signal,
} from '@angular/core';
import { ActivatedRoute, Router } from '@angular/router';
import { toSignal } from '@angular/core/rxjs-interop';
import { AgGridAngular } from 'ag-grid-angular';
import type { CellFocusedEvent, GridApi, GridOptions, GridReadyEvent, IDatasource } from 'ag-grid-community';
import {
  VERDICTS,
  type ImportDetail,
  type ImportRow,
  type RowFilter,
  type Verdict,
} from '#shared/contracts/imports';
import { asApiProblem } from '../../core/api/api-problem';
import { Undo } from '../../core/editing/undo';
import { Preferences } from '../../core/preferences/preferences';
import { confirmInDialog } from '../../ui/confirm-dialog/confirm-dialog';
import { gridDefaults } from '../../ui/data-grid/data-grid';
import { QuantityFormat } from '../../ui/quantity/quantity-format';
import { ImportInView } from './import-in-view';
import { VERDICT_INKS, VERDICT_SHAPES, VERDICT_WORDS } from './import-words';
import { MendMany } from './mend-many';
import { reasonWords } from './reason-words';
import { registerPaging, rowColumns } from './rows-grid';

const PAGE = 100;

/** Every row with its verdict; mended where it stands or many at once; and the way into the store. */
@Component({
  selector: 'wl-rows-step',
  imports: [AgGridAngular, MendMany],
  templateUrl: './rows-step.html',
  styleUrl: './rows-step.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RowsStep {
  readonly detail = input.required<ImportDetail>();

  protected readonly view = inject(ImportInView);
  private readonly router = inject(Router);
  private readonly preferences = inject(Preferences);
  private readonly undo = inject(Undo);
  private readonly injector = inject(Injector);
  private readonly address = toSignal(inject(ActivatedRoute).queryParamMap, { requireSync: true });
  private readonly grid = signal<GridApi<ImportRow> | undefined>(undefined);
  protected readonly total = signal<number | undefined>(undefined);

  /** The row that the focus is in, by its place among those shown: its reasons stand below the grid in full. */
  private readonly place = signal<number | undefined>(undefined);
  protected readonly focusedRow = computed(() => {
    const place = this.place();
    // Read anew after every change: a mended row has other reasons.
    this.detail();
    return place === undefined ? undefined : this.grid()?.getDisplayedRowAtIndex(place)?.data;
  });
  private readonly format = inject(QuantityFormat);
  private readonly language = computed(() => ({
    format: this.format,
    locale: this.preferences.numberLocale(),
  }));
  protected readonly focusedReasons = computed(() =>
    (this.focusedRow()?.reasons ?? []).map((reason) => reasonWords(reason, this.language())),
  );

  /** From the address, so that a reload shows the same rows. */
  protected readonly filter = computed<RowFilter>(() => {
    const asked = this.address();
    const verdict = VERDICTS.find((each) => each === asked.get('verdict'));
    const search = asked.get('search') ?? '';
    const column = asked.get('column') ?? '';
    return {
      ...(verdict === undefined ? {} : { verdict }),
      ...(search === '' ? {} : { search }),
      ...(/^\d{1,3}$/.test(column) ? { column: Number(column) } : {}),
    };
  });
  protected readonly chips = computed(() =>
    VERDICTS.map((verdict) => ({
      verdict,
      words: VERDICT_WORDS[verdict],
      shape: VERDICT_SHAPES[verdict],
      ink: VERDICT_INKS[verdict],
      count: this.detail().counts[verdict],
      pressed: this.filter().verdict === verdict,
    })),
  );
  protected readonly kept = computed(() => {
    const { accepted, cautioned } = this.detail().counts;
    return accepted + cautioned;
  });

  // Made once per file: new definitions would throw away widths that a person has set.
  protected readonly columns = computed(
    () => rowColumns(this.detail(), this.language, (row, column, text) => void this.mend(row, column, text)),
    { equal: (one, other) => one.length === other.length },
  );
  protected readonly options: GridOptions<ImportRow> = {
    ...gridDefaults<ImportRow>(),
    rowModelType: 'infinite',
    cacheBlockSize: PAGE,
    maxBlocksInCache: 20,
    infiniteInitialRowCount: 1,
    getRowId: ({ data }) => String(data.rowNumber),
    rowHeight: this.preferences.density() === 'compact' ? 32 : 36,
    tooltipShowDelay: 400,
    defaultColDef: { sortable: false, resizable: true, suppressHeaderMenuButton: true },
    singleClickEdit: false,
    stopEditingWhenCellsLoseFocus: true,
  };

  constructor() {
    registerPaging();
    effect(() => {
      const filter = this.filter();
      this.grid()?.setGridOption('datasource', this.source(filter));
    });
    effect(() => {
      this.view.rowsChanged();
      this.grid()?.refreshInfiniteCache();
    });
  }

  protected ready({ api }: GridReadyEvent<ImportRow>): void {
    this.grid.set(api);
  }

  protected focused({ rowIndex }: CellFocusedEvent<ImportRow>): void {
    this.place.set(rowIndex ?? undefined);
  }

  protected show(verdict: Verdict): void {
    this.narrow({ verdict: this.filter().verdict === verdict ? undefined : verdict });
  }

  protected narrow(queryParams: { verdict?: string; search?: string; column?: string }): void {
    void this.router.navigate([], { queryParams, queryParamsHandling: 'merge', replaceUrl: true });
  }

  protected searchFor(text: string): void {
    this.narrow({ search: text.trim() === '' ? undefined : text });
  }

  protected inColumn(column: string): void {
    this.narrow({ column: column === '' ? undefined : column });
  }

  protected async confirm(): Promise<void> {
    if (this.view.busy() || this.kept() === 0) return;
    const { counts, willStore } = this.detail();
    const sure =
      counts.refused === 0 ||
      (await runInInjectionContext(this.injector, () =>
        confirmInDialog({
          title: $localize`Store without the refused rows?`,
          detail: $localize`${counts.refused}:REFUSED: refused rows stay out; ${willStore.results}:RESULTS: results are stored. To bring the others in later you need a file with them alone.`,
          confirm: $localize`Store ${willStore.results}:RESULTS: results`,
          cancel: $localize`Mend them first`,
        }),
      ));
    if (sure) await this.view.confirm();
  }

  private async mend(row: ImportRow, column: number, text: string): Promise<void> {
    if (text.trim() === (row.cells[column] ?? '')) return;
    const changed = await this.view.fix({ kind: 'cell', rowNumber: row.rowNumber, column, text });
    if (changed === 0)
      this.undo.say(
        $localize`Row ${row.rowNumber}:ROW: has more cells than headings: mend it in the file, or skip it.`,
      );
  }

  private source(filter: RowFilter): IDatasource {
    return {
      getRows: ({ startRow, endRow, successCallback, failCallback }) => {
        this.view.rows(filter, startRow, endRow - startRow).then(
          (page) => {
            this.total.set(page?.total);
            successCallback([...(page?.rows ?? [])], page?.total ?? 0);
          },
          (error: unknown) => {
            this.view.problem.set(asApiProblem(error));
            failCallback();
          },
        );
      },
    };
  }
}
