import {
  ChangeDetectionStrategy,
  Component,
  Injector,
  computed,
  inject,
  input,
  output,
  runInInjectionContext,
} from '@angular/core';
import type { Adoption } from '#shared/contracts/adoptions';
import type { JudgementFields } from '#shared/contracts/judgements';
import type { Result } from '#shared/contracts/results';
import type { ResultInput } from '#shared/core/ranking/ranking-input';
import { Session } from '../../../core/session/session';
import type { EvidenceDecision } from '../../../data/results/evidence-decision';
import { askInDialog } from '../../../ui/confirm-dialog/confirm-dialog';
import { decideAdoption, type OfferedResult } from '../adoption/adoption-dialog';
import {
  checkQuestion,
  includeQuestion,
  releaseQuestion,
  setAsideQuestion,
  uncheckQuestion,
  withdrawQuestion,
} from '../judgement/judgement-deeds';
import { judgementOrder } from '../judgement/judgement-order';

/** What the person may do with the result, each with its question; what was decided is handed on. */
@Component({
  selector: 'wl-result-deeds',
  templateUrl: './result-deeds.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ResultDeeds {
  readonly programmeId = input.required<string>();
  readonly result = input.required<Result>();
  /** The result as the method reads it; absent where it cannot be ranked at all. */
  readonly input = input<ResultInput>();
  readonly variantName = input.required<string>();
  readonly standing = input<Adoption>();
  /** The variant's results that stand. */
  readonly offered = input.required<readonly OfferedResult[]>();
  readonly notComparable = input.required<boolean>();
  readonly busy = input.required<boolean>();
  readonly decided = output<EvidenceDecision>();

  private readonly session = inject(Session);
  private readonly injector = inject(Injector);
  protected readonly mayAdopt = computed(() => this.session.may('results.adopt'));
  protected readonly mayCheck = computed(() => this.session.may('results.check'));
  protected readonly mayJudge = computed(() => this.session.may('results.judge'));
  protected readonly mayWithdraw = computed(() => this.session.may('results.withdraw'));

  protected async adopt(): Promise<void> {
    const { id, variantId, adopted } = this.result();
    const target = {
      variantId,
      variantName: this.variantName(),
      standing: this.standing(),
      offered: this.offered(),
      resultIds: adopted ? (this.standing()?.resultIds ?? [id]) : [id],
    };
    const decision = await runInInjectionContext(this.injector, () =>
      decideAdoption({ programmeId: this.programmeId(), targets: [target] }),
    );
    if (decision) this.decided.emit(decision);
  }

  protected async release(): Promise<void> {
    const { name, variantId } = this.result();
    const expectedAdoptionId = this.standing()?.id;
    await this.askThen(releaseQuestion(name, this.variantName()), (comment) => ({
      kind: 'adopt',
      adoptions: [{ variantId, resultIds: [], rule: 'newest', expectedAdoptionId }],
      comment,
    }));
  }

  protected async check(): Promise<void> {
    const { id, name } = this.result();
    await this.askThen(checkQuestion(name), (comment) => ({
      kind: 'check',
      resultIds: [id],
      state: 'checked',
      comment,
    }));
  }

  protected async uncheck(): Promise<void> {
    const { id, name } = this.result();
    await this.askThen(uncheckQuestion(name), (comment) => ({
      kind: 'check',
      resultIds: [id],
      state: 'entered',
      comment,
    }));
  }

  protected async include(): Promise<void> {
    await this.askThen(includeQuestion(this.result().name), (includedReason) =>
      this.judged({ includedReason }),
    );
  }

  protected async setAside(): Promise<void> {
    await this.askThen(setAsideQuestion(this.result().name), (setAsideReason) =>
      this.judged({ setAsideReason }),
    );
  }

  protected async withdraw(): Promise<void> {
    const { id, name, adopted } = this.result();
    await this.askThen(withdrawQuestion(name, adopted, this.variantName()), (reason) => ({
      kind: 'withdraw',
      resultIds: [id],
      reason,
    }));
  }

  protected judge(changes: Partial<JudgementFields>): void {
    this.decided.emit(this.judged(changes));
  }

  private judged(changes: Partial<JudgementFields>): EvidenceDecision {
    return { kind: 'judge', judgements: [judgementOrder(this.result(), this.input(), changes)] };
  }

  private async askThen(
    question: Parameters<typeof askInDialog>[0],
    decision: (answer: string) => EvidenceDecision,
  ): Promise<void> {
    const answer = await runInInjectionContext(this.injector, () => askInDialog(question));
    if (answer !== undefined) this.decided.emit(decision(answer));
  }
}
