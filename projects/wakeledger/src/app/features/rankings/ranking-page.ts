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
import { toSignal } from '@angular/core/rxjs-interop';
import { ActivatedRoute, Router, RouterLink } from '@angular/router';
import { Store } from '@ngrx/store';
import { CHOICE_NAMES, type ChoiceName, type ChoiceQuery } from '#shared/core/ranking/ranking-choices';
import type { RankingView } from '#shared/core/ranking/ranking-view';
import { lowestInputOfView } from '#shared/core/ranking/ranking-view-lowest';
import { type CsvCell, csvText } from '../../core/export/csv';
import { saveText } from '../../core/export/save-file';
import { saveWorkbook } from '../../core/export/workbook';
import { Session } from '../../core/session/session';
import { LowestProbabilities } from '../../data/rankings/lowest-probabilities';
import { type RankingMode, RankingPageActions } from '../../data/rankings/rankings.actions';
import { rankingsFeature } from '../../data/rankings/rankings.feature';
import { selectRankingRefusal, selectRankingView } from '../../data/rankings/rankings.selectors';
import { Busy } from '../../ui/busy/busy';
import { DerivationOpener } from '../../ui/derivation-sheet/derivation-sheet';
import { EmptyState } from '../../ui/empty-state/empty-state';
import { ProblemBanner } from '../../ui/problem-banner/problem-banner';
import { QuantityFormat } from '../../ui/quantity/quantity-format';
import { FigureDerivations } from './derivations/figure-derivations';
import { PairPanel } from './pair-panel';
import { OrderComparison } from './order-comparison';
import { RankingChart } from './ranking-chart';
import { typedArea } from './typed-area';
import { RankingControls } from './ranking-controls';
import { markedAsTried, rankingRows } from './ranking-export';
import { type FigureAsked, RankingTable } from './ranking-table';
import { StayedOut } from './stayed-out';
import { TryingPanel } from './trying/trying-panel';
import { groupSentence, ignoredSentences, noticeSentence } from './ranking-words';

/** Which variant drags most? The ranking, what it rests on, and what it cannot tell. */
@Component({
  selector: 'wl-ranking-page',
  imports: [
    Busy,
    EmptyState,
    OrderComparison,
    PairPanel,
    ProblemBanner,
    RankingChart,
    RankingControls,
    RankingTable,
    RouterLink,
    StayedOut,
    TryingPanel,
  ],
  templateUrl: './ranking-page.html',
  styleUrl: './ranking-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RankingPage {
  readonly programmeId = input.required<string>();

  private readonly store = inject(Store);
  private readonly router = inject(Router);
  private readonly route = inject(ActivatedRoute);
  private readonly session = inject(Session);
  private readonly format = inject(QuantityFormat);
  private readonly derivations = inject(FigureDerivations);
  private readonly opener = inject(DerivationOpener);
  private readonly query = toSignal(this.route.queryParamMap);

  protected readonly address = computed((): ChoiceQuery => {
    const query = this.query();
    const texts = CHOICE_NAMES.map((name): [ChoiceName, string | undefined] => [
      name,
      query?.get(name) ?? undefined,
    ]);
    return Object.fromEntries(texts.filter(([, text]) => text !== undefined));
  });
  protected readonly view = this.store.selectSignal(selectRankingView);
  protected readonly loading = this.store.selectSignal(rankingsFeature.selectLoading);
  protected readonly refusal = this.store.selectSignal(selectRankingRefusal);
  protected readonly problem = computed(() => {
    const loading = this.loading();
    return loading.kind === 'failed' ? loading.problem : undefined;
  });
  /** Why there is no ranking at all: a state to be led out of, not a failure. */
  protected readonly empty = computed((): 'no-variants' | 'no-common-area' | 'no-results' | 'none' => {
    const reason = this.problem()?.problem?.reason;
    if (reason === 'no-variants' || reason === 'no-common-area') return reason;
    const view = this.view();
    if (view && view.offers.areas.length === 0) return 'no-variants';
    return view && view.resultCount === 0 ? 'no-results' : 'none';
  });
  protected readonly mayEnter = computed(() => this.session.may('results.enter'));
  protected readonly mayEdit = computed(() => this.session.may('programmes.edit'));
  protected readonly mayAdjust = computed(() => this.session.may('adjustments.edit'));
  private readonly tried = this.store.selectSignal(rankingsFeature.selectTried);
  protected readonly mayTry = computed(
    () => this.session.may('proposals.make') && this.session.may('ranking-inputs.read'),
  );
  protected readonly tryingAsked = signal(false);
  /** What is tried is never out of sight. */
  protected readonly tryingShown = computed(() => this.tryingAsked() || this.tried().length > 0);
  protected readonly chartShown = signal(false);
  protected readonly ordersShown = signal(false);
  protected readonly areaRefused = signal(false);

  protected readonly lowest = inject(LowestProbabilities).of(
    computed(
      () => {
        const view = this.view();
        return view && view.rows.length > 0 ? lowestInputOfView(view) : null;
      },
      { equal: (a, b) => a === b || sameFigures(a, b) },
    ),
  );

  protected readonly reynolds = computed(() =>
    this.format.value((this.view()?.referenceReynolds ?? 0) / 1e6, 'number', { digits: 1 }),
  );
  protected readonly notices = computed(() =>
    (this.view()?.notices ?? []).map((notice) => ({
      order: notice.order,
      words: this.worded((view) => noticeSentence(notice, view, this.format)),
    })),
  );
  protected readonly ignored = computed(() => {
    const view = this.view();
    return view ? ignoredSentences(view) : [];
  });
  protected readonly groups = computed(() =>
    (this.view()?.groups ?? []).map((group) =>
      this.worded((view) => groupSentence(group, view, this.format)),
    ),
  );
  constructor() {
    let opened = '';
    effect(() => {
      const programmeId = this.programmeId();
      const address = this.address();
      untracked(() => {
        if (programmeId === opened) {
          this.store.dispatch(RankingPageActions.addressChanged({ address }));
          return;
        }
        opened = programmeId;
        const mode: RankingMode = this.session.may('ranking-inputs.read') ? 'computes' : 'is-given';
        this.store.dispatch(RankingPageActions.opened({ programmeId, mode, address }));
      });
    });
  }

  /** Into the address, and nowhere else: the ranking follows it. */
  protected async choose(address: ChoiceQuery): Promise<void> {
    await this.router.navigate([], { relativeTo: this.route, queryParams: address });
  }

  /** Without a common area of the programme, on one of the person's own: it goes into the address like every choice. */
  protected async rankOn(text: string): Promise<void> {
    const areaM2 = typedArea(text);
    this.areaRefused.set(areaM2 === null);
    if (areaM2 !== null) await this.choose({ ...this.address(), area: String(areaM2) });
  }

  protected retry(): void {
    this.store.dispatch(RankingPageActions.retryPressed());
  }

  protected open({ row, kind }: FigureAsked): void {
    const view = this.view();
    if (view) this.opener.open(this.derivations.of(kind, row, view));
  }

  protected saveCsv(): void {
    const view = this.view();
    if (view) saveText(csvText(this.savedRows(view)), `${this.savedName(view)}.csv`);
  }

  protected async saveAsWorkbook(): Promise<void> {
    const view = this.view();
    if (!view) return;
    await saveWorkbook(
      [{ name: $localize`Ranking`, rows: this.savedRows(view) }],
      `${this.savedName(view)}.xlsx`,
    );
  }

  private savedRows(view: RankingView): readonly (readonly CsvCell[])[] {
    const rows = rankingRows(view, this.lowest());
    return this.tried().length === 0 ? rows : markedAsTried(rows);
  }

  private savedName({ programmeName }: RankingView): string {
    return this.tried().length === 0
      ? `${programmeName} ranking`
      : `${programmeName} ranking, tried, not saved`;
  }

  private worded(words: (view: NonNullable<ReturnType<RankingPage['view']>>) => string): string {
    const view = this.view();
    return view ? words(view) : '';
  }
}

type Sampled = ReturnType<typeof lowestInputOfView> | null;

/** A control that moves no figure (area, confidence, cycle) asks for no new draws. */
function sameFigures(a: Sampled, b: Sampled): boolean {
  return (
    a !== null &&
    b !== null &&
    a.ids.length === b.ids.length &&
    a.ids.every((id, row) => id === b.ids[row]) &&
    a.values.every((value, row) => value === b.values[row]) &&
    a.ownAmounts.every((amount, row) => amount === b.ownAmounts[row]) &&
    a.sharedAmounts.every((amount, at) => amount === b.sharedAmounts[at])
  );
}
