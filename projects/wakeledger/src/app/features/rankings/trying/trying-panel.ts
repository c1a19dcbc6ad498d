import { ChangeDetectionStrategy, Component, computed, inject, input, output, signal } from '@angular/core';
import { Router } from '@angular/router';
import { Store } from '@ngrx/store';
import { firstValueFrom } from 'rxjs';
import type { JudgementChange } from '#shared/contracts/proposals';
import { withChange } from '#shared/core/ranking/judgement-changes';
import type { ChoiceQuery } from '#shared/core/ranking/ranking-choices';
import type { RankingView } from '#shared/core/ranking/ranking-view';
import { type ApiProblem, asApiProblem } from '../../../core/api/api-problem';
import { newCommandKey } from '../../../core/api/command-key';
import { ProposalsApi, type NewProposal } from '../../../data/proposals/proposals-api';
import { TryingActions } from '../../../data/rankings/rankings.actions';
import { rankingsFeature } from '../../../data/rankings/rankings.feature';
import {
  selectRankedSources,
  selectTriedComparison,
  selectTriedRankings,
  selectWithoutSubject,
} from '../../../data/rankings/rankings.selectors';
import { ProblemBanner } from '../../../ui/problem-banner/problem-banner';
import { QuantityFormat } from '../../../ui/quantity/quantity-format';
import { RankingMoves } from '../../../ui/ranking-moves/ranking-moves';
import { changeWords } from '../../../ui/words/change-words';
import { storedSubjects } from './stored-subjects';
import { TryEvidence } from './try-evidence';
import { TryFacility } from './try-facility';
import { TryLimits } from './try-limits';
import { TryResult } from './try-result';

const ABOUT = [
  { about: 'result', words: $localize`a result: in or out` },
  { about: 'evidence', words: $localize`what a variant rests on` },
  { about: 'facility', words: $localize`a facility’s corrections` },
  { about: 'limits', words: $localize`a limit, or the friction line` },
] as const;

const figuresOf = ({ rows }: RankingView) =>
  rows.map(({ variantId, figure }) => ({ variantId, dragAreaM2: figure.dragAreaM2 }));

/** Changes of judgement that are tried on this ranking: what they are, what they do, and what becomes of them. */
@Component({
  selector: 'wl-trying-panel',
  imports: [ProblemBanner, RankingMoves, TryEvidence, TryFacility, TryLimits, TryResult],
  templateUrl: './trying-panel.html',
  styleUrl: './trying-panel.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class TryingPanel {
  readonly programmeId = input.required<string>();
  readonly view = input<RankingView | null>(null);
  readonly address = input.required<ChoiceQuery>();
  readonly closed = output();

  private readonly store = inject(Store);
  private readonly api = inject(ProposalsApi);
  private readonly router = inject(Router);
  private readonly format = inject(QuantityFormat);
  private readonly stored = this.store.selectSignal(rankingsFeature.selectSources);
  private readonly rankings = this.store.selectSignal(selectTriedRankings);
  private readonly idle = this.store.selectSignal(selectWithoutSubject);
  protected readonly sources = this.store.selectSignal(selectRankedSources);
  protected readonly tried = this.store.selectSignal(rankingsFeature.selectTried);
  protected readonly comparison = this.store.selectSignal(selectTriedComparison);

  protected readonly offers = ABOUT;
  protected readonly about = signal<string>('result');
  protected readonly title = signal('');
  protected readonly comment = signal('');
  protected readonly saving = signal(false);
  protected readonly problem = signal<ApiProblem | undefined>(undefined);
  protected readonly lines = computed(() => {
    const stored = this.stored();
    if (stored === null) return [];
    const subjects = storedSubjects(stored);
    return this.tried().map((change) => ({
      change,
      words: changeWords(change, subjects, this.format),
      idle: this.idle().includes(change),
    }));
  });
  protected readonly ready = computed(
    () =>
      this.title().trim().length >= 3 &&
      this.comment().trim().length >= 3 &&
      this.rankings() !== null &&
      !this.saving(),
  );
  private commandKey = newCommandKey();

  protected add(change: JudgementChange): void {
    this.hold(withChange(this.tried(), change));
  }

  protected drop(change: JudgementChange): void {
    this.hold(this.tried().filter((each) => each !== change));
  }

  protected dropAll(): void {
    this.hold([]);
  }

  protected async propose(): Promise<void> {
    const rankings = this.rankings();
    if (rankings === null) return;
    this.saving.set(true);
    this.problem.set(undefined);
    try {
      const { id } = await firstValueFrom(
        this.api.make(
          this.programmeId(),
          {
            title: this.title().trim(),
            comment: this.comment().trim(),
            changes: [...this.tried()],
            query: this.address() as NewProposal['query'],
            seen: { before: figuresOf(rankings.before), after: figuresOf(rankings.after) },
          },
          this.commandKey,
        ),
      );
      this.hold([]);
      await this.router.navigate(['/programmes', this.programmeId(), 'proposals', id]);
    } catch (error) {
      this.problem.set(asApiProblem(error));
      this.commandKey = newCommandKey();
    } finally {
      this.saving.set(false);
    }
  }

  private hold(changes: readonly JudgementChange[]): void {
    this.problem.set(undefined);
    this.store.dispatch(TryingActions.changed({ programmeId: this.programmeId(), changes }));
  }
}
