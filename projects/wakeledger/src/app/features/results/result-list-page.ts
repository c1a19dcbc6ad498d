import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  signal,
  untracked,
} from '@angular/core';
import { Router, RouterLink } from '@angular/router';
import { Store } from '@ngrx/store';
import { AgGridAngular } from 'ag-grid-angular';
import type {
  CellClickedEvent,
  CellKeyDownEvent,
  FullWidthCellKeyDownEvent,
  GridApi,
  GridOptions,
  GridReadyEvent,
  SelectionChangedEvent,
  StateUpdatedEvent,
} from 'ag-grid-community';
import type { ApiProblem } from '../../core/api/api-problem';
import { Undo } from '../../core/editing/undo';
import { problemWords } from '../../core/errors/problem-words';
import { saveText } from '../../core/export/save-file';
import { saveWorkbook } from '../../core/export/workbook';
import { Preferences } from '../../core/preferences/preferences';
import { Session } from '../../core/session/session';
import { facilitiesFeature } from '../../data/facilities/facilities.feature';
import type { EvidenceDecision } from '../../data/results/evidence-decision';
import { ResultListPageActions } from '../../data/results/results.actions';
import { policiesFeature } from '../../data/policies/policies.feature';
import { resultsFeature } from '../../data/results/results.feature';
import { variantsFeature } from '../../data/variants/variants.feature';
import { Busy } from '../../ui/busy/busy';
import { gridDefaults } from '../../ui/data-grid/data-grid';
import { EmptyState } from '../../ui/empty-state/empty-state';
import { ProblemBanner } from '../../ui/problem-banner/problem-banner';
import { QuantityFormat } from '../../ui/quantity/quantity-format';
import { adoptionTargets } from './adoption/adoption-targets';
import { doneWords } from './done-words';
import { GridMemory } from './grid-memory';
import { BulkDeeds } from './list/bulk-deeds';
import { CHECK_INKS, CHECK_SHAPES, CHECK_STATES, CHECK_WORDS, type CheckState } from './result-check';
import { resultColumns } from './result-columns';
import { resultsCsv, resultsTable } from './result-export';
import { resultRows, type ResultRow } from './result-rows';

const GRID = 'results';

/** What evidence do we have, and can it be compared? */
@Component({
  selector: 'wl-result-list-page',
  imports: [AgGridAngular, BulkDeeds, Busy, EmptyState, ProblemBanner, RouterLink],
  templateUrl: './result-list-page.html',
  styleUrl: './result-list-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ResultListPage {
  readonly programmeId = input.required<string>();
  /** From the address: text searched for, and the check that is shown. */
  readonly search = input<string>();
  readonly check = input<string>();

  private readonly store = inject(Store);
  private readonly router = inject(Router);
  private readonly session = inject(Session);
  private readonly undo = inject(Undo);
  private readonly memory = inject(GridMemory);
  private readonly format = inject(QuantityFormat);
  private readonly preferences = inject(Preferences);
  private api: GridApi<ResultRow> | undefined;

  protected readonly mayEnter = computed(() => this.session.may('results.enter'));
  protected readonly mayImport = computed(() => this.session.may('imports.run'));
  protected readonly loading = this.store.selectSignal(resultsFeature.selectLoading);
  private readonly results = this.store.selectSignal(resultsFeature.selectResults);
  private readonly reduced = this.store.selectSignal(resultsFeature.selectReduced);
  private readonly inputsProblem = this.store.selectSignal(resultsFeature.selectInputsProblem);
  private readonly variants = this.store.selectSignal(variantsFeature.selectById);
  private readonly facilities = this.store.selectSignal(facilitiesFeature.selectById);
  private readonly limits = this.store.selectSignal(policiesFeature.selectLimits);

  protected readonly problem = computed(() => {
    const loading = this.loading();
    return loading.kind === 'failed' ? loading.problem : undefined;
  });
  /** Why nothing could be reduced, in words. */
  protected readonly unchecked = computed(() => {
    const refusal = this.reduced().refusal;
    if (refusal) return refusal.detail;
    const problem = this.inputsProblem();
    if (!problem) return undefined;
    const { title, detail } = problemWords(problem);
    return detail ?? title;
  });
  protected readonly rows = computed(() =>
    resultRows(
      this.results(),
      this.reduced(),
      {
        variant: (id) => this.variants().get(id)?.name ?? '…',
        facility: (id) => this.facilities().get(id)?.name ?? '…',
        bodyShape: (id) => this.variants().get(id)?.bodyShape,
      },
      { format: this.format, locale: this.preferences.numberLocale() },
      { unchecked: this.unchecked(), limits: this.limits() },
    ),
  );
  private readonly chosen = computed(() => CHECK_STATES.find((state) => state === this.check()));
  protected readonly shown = computed<ResultRow[]>(() => {
    const state = this.chosen();
    return this.rows().filter((row) => state === undefined || row.check.state === state);
  });
  /** A short list takes the room that it needs; a long one scrolls within the page. */
  protected readonly isShort = computed(() => this.shown().length <= 12);
  protected readonly chips = computed(() => {
    const counts = new Map<CheckState, number>();
    for (const { check } of this.rows()) counts.set(check.state, (counts.get(check.state) ?? 0) + 1);
    return CHECK_STATES.filter((state) => counts.has(state)).map((state) => ({
      state,
      words: CHECK_WORDS[state],
      shape: CHECK_SHAPES[state],
      ink: CHECK_INKS[state],
      count: counts.get(state) ?? 0,
      pressed: this.chosen() === state,
    }));
  });

  protected readonly columns = computed(() => resultColumns(this.format, (row) => this.addressOf(row)));
  protected readonly options: GridOptions<ResultRow> = {
    ...gridDefaults<ResultRow>(),
    initialState: this.memory.read(GRID),
    getRowId: ({ data }) => data.id,
    rowHeight: this.preferences.density() === 'compact' ? 32 : 40,
    tooltipShowDelay: 400,
    rowSelection: { mode: 'multiRow', selectAll: 'filtered', enableClickSelection: false },
    rowClassRules: { withdrawn: ({ data }) => data?.check.state === 'withdrawn' },
  };

  private readonly selectedIds = signal<ReadonlySet<string>>(new Set());
  protected readonly selected = computed(() => this.results().filter(({ id }) => this.selectedIds().has(id)));
  private readonly deed = this.store.selectSignal(resultsFeature.selectDeed);
  private readonly inputs = this.store.selectSignal(resultsFeature.selectInputs);
  private readonly standing = this.store.selectSignal(resultsFeature.selectStanding);
  protected readonly busy = computed(() => this.deed().kind === 'under-way');
  protected readonly refusal = signal<ApiProblem | undefined>(undefined);
  protected readonly inputOf = computed(() => {
    const inputs = new Map(this.inputs()?.results.map((each) => [each.id, each]));
    return (resultId: string) => inputs.get(resultId);
  });
  protected readonly targets = computed(() =>
    adoptionTargets(
      this.selected(),
      this.results(),
      this.standing(),
      {
        reductions: this.reduced().reductions,
        variantName: (id) => this.variants().get(id)?.name ?? '…',
        facilityName: (id) => this.facilities().get(id)?.name ?? '…',
      },
      this.format,
    ),
  );

  constructor() {
    effect(() => {
      const programmeId = this.programmeId();
      untracked(() => this.store.dispatch(ResultListPageActions.opened({ programmeId })));
    });
    effect(() => {
      const deed = this.deed();
      untracked(() => {
        if (deed.kind !== 'decided' && deed.kind !== 'refused') return;
        this.store.dispatch(ResultListPageActions.outcomeSeen());
        if (deed.kind === 'refused') return this.refusal.set(deed.problem);
        this.undo.say(doneWords(deed.done, this.selected()[0]?.name ?? ''));
        this.selectNone();
      });
    });
  }

  protected select({ api }: SelectionChangedEvent<ResultRow>): void {
    this.selectedIds.set(new Set(api.getSelectedRows().map(({ id }) => id)));
  }

  protected selectNone(): void {
    this.api?.deselectAll();
  }

  protected decide(decision: EvidenceDecision): void {
    this.refusal.set(undefined);
    this.store.dispatch(
      ResultListPageActions.decisionConfirmed({ programmeId: this.programmeId(), decision }),
    );
  }

  protected retry(): void {
    this.store.dispatch(ResultListPageActions.askedAgain({ programmeId: this.programmeId() }));
  }

  protected ready({ api }: GridReadyEvent<ResultRow>): void {
    this.api = api;
  }

  protected remember({ state, sources }: StateUpdatedEvent<ResultRow>): void {
    if (!sources.includes('gridInitializing')) this.memory.keep(GRID, state);
  }

  /** Back to the columns and filters that the list begins with. */
  protected startAfresh(): void {
    this.memory.forget(GRID);
    this.api?.setFilterModel(null);
    this.api?.resetColumnState();
    this.narrow({ search: undefined, check: undefined });
  }

  protected searchFor(text: string): void {
    this.narrow({ search: text.trim() === '' ? undefined : text });
  }

  protected show(state: CheckState): void {
    this.narrow({ check: this.chosen() === state ? undefined : state });
  }

  /** A plain click or Enter opens the result; a click with a modifier stays the browser's. */
  protected clicked({ event, data, column }: CellClickedEvent<ResultRow>): void {
    if (!(event instanceof MouseEvent) || column.getColId() !== 'name' || !data) return;
    if (event.ctrlKey || event.metaKey || event.shiftKey || event.button !== 0) return;
    event.preventDefault();
    void this.router.navigateByUrl(this.addressOf(data));
  }

  protected pressed({
    event,
    data,
  }: CellKeyDownEvent<ResultRow> | FullWidthCellKeyDownEvent<ResultRow>): void {
    if (event instanceof KeyboardEvent && event.key === 'Enter' && data) {
      void this.router.navigateByUrl(this.addressOf(data));
    }
  }

  /** What is shown, in its order: every filter and the sorting count. */
  protected save(): void {
    saveText(resultsCsv(this.rowsInOrder()), $localize`results.csv`);
  }

  protected async saveAsWorkbook(): Promise<void> {
    const rows = resultsTable(this.rowsInOrder());
    await saveWorkbook([{ name: $localize`Results`, rows }], $localize`results.xlsx`);
  }

  private rowsInOrder(): readonly ResultRow[] {
    const rows: ResultRow[] = [];
    this.api?.forEachNodeAfterFilterAndSort(({ data }) => {
      if (data) rows.push(data);
    });
    return rows;
  }

  private addressOf({ id }: Pick<ResultRow, 'id'>): string {
    return `/programmes/${this.programmeId()}/results/${id}`;
  }

  private narrow(queryParams: { readonly search?: string; readonly check?: string }): void {
    void this.router.navigate([], { queryParams, queryParamsHandling: 'merge', replaceUrl: true });
  }
}
