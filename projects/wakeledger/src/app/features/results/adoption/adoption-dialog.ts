import { DIALOG_DATA, Dialog, DialogRef } from '@angular/cdk/dialog';
import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import { rxResource } from '@angular/core/rxjs-interop';
import { firstValueFrom } from 'rxjs';
import type { Adoption, AdoptionOrder } from '#shared/contracts/adoptions';
import type { EVIDENCE_RULES } from '#shared/contracts/judgements';
import { asApiProblem } from '../../../core/api/api-problem';
import type { EvidenceDecision } from '../../../data/results/evidence-decision';
import { RankingsApi } from '../../../data/rankings/rankings-api';
import { Busy } from '../../../ui/busy/busy';
import { ProblemBanner } from '../../../ui/problem-banner/problem-banner';
import { QuantityFormat } from '../../../ui/quantity/quantity-format';
import { RankingMoves } from '../../../ui/ranking-moves/ranking-moves';
import { adoptedRanking, previewAdoption } from './adoption-preview';
import { combinationLines } from './combination-words';

type EvidenceRule = (typeof EVIDENCE_RULES)[number];

/** A result that may be chosen, in words. */
export interface OfferedResult {
  readonly id: string;
  readonly name: string;
  readonly words: string;
}

/** A variant whose evidence is decided about. */
export interface AdoptionTarget {
  readonly variantId: string;
  readonly variantName: string;
  readonly standing: Adoption | undefined;
  readonly offered: readonly OfferedResult[];
  /** Chosen when the dialog opens. */
  readonly resultIds: readonly string[];
}

export interface AdoptionQuestion {
  readonly programmeId: string;
  readonly targets: readonly AdoptionTarget[];
}

interface Choice {
  readonly resultIds: readonly string[];
  readonly rule: EvidenceRule;
}

/** Lets variants rest on results: which, by which rule, and what it does to the ranking before it is confirmed. */
@Component({
  selector: 'wl-adoption-dialog',
  imports: [Busy, ProblemBanner, RankingMoves],
  templateUrl: './adoption-dialog.html',
  styleUrl: './adoption-dialog.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class AdoptionDialog {
  protected readonly question = inject<AdoptionQuestion>(DIALOG_DATA);
  private readonly dialog = inject<DialogRef<EvidenceDecision, AdoptionDialog>>(DialogRef);
  private readonly api = inject(RankingsApi);
  private readonly format = inject(QuantityFormat);

  protected readonly comment = signal('');
  private readonly choices = signal<ReadonlyMap<string, Choice>>(
    new Map(
      this.question.targets.map(({ variantId, resultIds, standing }) => [
        variantId,
        { resultIds, rule: resultIds.length > 1 ? (standing?.rule ?? 'newest') : 'newest' },
      ]),
    ),
  );
  protected readonly sources = rxResource({
    stream: () => this.api.sources(this.question.programmeId, undefined),
  });
  protected readonly problem = computed(() => {
    const error = this.sources.error();
    return error === undefined ? undefined : asApiProblem(error);
  });
  private readonly before = computed(() => {
    if (!this.sources.hasValue()) return undefined;
    const { inputs, context } = this.sources.value();
    return adoptedRanking(inputs, context);
  });
  private readonly orders = computed<readonly AdoptionOrder[]>(() =>
    this.question.targets.map(({ variantId, standing }) => {
      const { resultIds, rule } = this.choices().get(variantId) ?? { resultIds: [], rule: 'newest' };
      return { variantId, resultIds: [...resultIds], rule, expectedAdoptionId: standing?.id };
    }),
  );
  private readonly outcome = computed(() => {
    const before = this.before();
    if (before === undefined || !this.sources.hasValue()) return undefined;
    const { inputs, context } = this.sources.value();
    return previewAdoption(inputs, context, before, this.orders());
  });
  protected readonly preview = computed(() => {
    const outcome = this.outcome();
    return outcome !== undefined && 'comparison' in outcome ? outcome : undefined;
  });
  protected readonly refused = computed(() => {
    const outcome = this.outcome();
    return outcome !== undefined && 'code' in outcome ? outcome.detail : undefined;
  });
  protected readonly targets = computed(() =>
    this.question.targets.map((target) => {
      const choice = this.choices().get(target.variantId) ?? { resultIds: [], rule: 'newest' as const };
      const combination = this.preview()?.combinations.get(target.variantId);
      return {
        ...target,
        ...choice,
        chosen: new Set(choice.resultIds),
        now: target.offered
          .filter(({ id }) => target.standing?.resultIds.includes(id))
          .map(({ name }) => name)
          .join(', '),
        several: choice.resultIds.length > 1,
        combination: combination === undefined ? [] : combinationLines(combination, this.format),
      };
    }),
  );
  protected readonly releases = computed(() =>
    this.orders().every(({ resultIds }) => resultIds.length === 0),
  );
  protected readonly ready = computed(
    () => this.comment().trim().length >= 3 && this.orders().some(({ resultIds }) => resultIds.length > 0),
  );

  protected choose(variantId: string, resultId: string, chosen: boolean): void {
    this.change(variantId, ({ resultIds, rule }) => {
      const others = resultIds.filter((id) => id !== resultId);
      const now = chosen ? [...others, resultId] : others;
      return { resultIds: now, rule: now.length > 1 ? rule : 'newest' };
    });
  }

  protected rule(variantId: string, rule: EvidenceRule): void {
    this.change(variantId, ({ resultIds }) => ({ resultIds, rule }));
  }

  protected confirm(): void {
    const adoptions = this.orders().filter(({ resultIds }) => resultIds.length > 0);
    this.dialog.close({ kind: 'adopt', adoptions, comment: this.comment().trim() });
  }

  protected close(): void {
    this.dialog.close();
  }

  private change(variantId: string, to: (choice: Choice) => Choice): void {
    this.choices.update((choices) => {
      const choice = choices.get(variantId);
      return choice === undefined ? choices : new Map(choices).set(variantId, to(choice));
    });
  }
}

/** Opens the dialog and waits for what was decided, or undefined. Needs an injection context. */
export async function decideAdoption(question: AdoptionQuestion): Promise<EvidenceDecision | undefined> {
  const dialog = inject(Dialog).open<EvidenceDecision, AdoptionQuestion, AdoptionDialog>(AdoptionDialog, {
    data: question,
    ariaLabelledBy: 'wl-adoption-title',
    autoFocus: '#wl-adoption-title',
  });
  return firstValueFrom(dialog.closed, { defaultValue: undefined });
}
