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
import type { Result } from '#shared/contracts/results';
import type { ResultInput } from '#shared/core/ranking/ranking-input';
import { Session } from '../../../core/session/session';
import type { EvidenceDecision } from '../../../data/results/evidence-decision';
import { askInDialog } from '../../../ui/confirm-dialog/confirm-dialog';
import { type AdoptionTarget, decideAdoption } from '../adoption/adoption-dialog';
import { judgementOrder } from '../judgement/judgement-order';
import { checkManyQuestion, setManyAsideQuestion, withdrawManyQuestion } from '../judgement/judgement-deeds';

/** What may be done with several results at once, each with one comment for all of them. */
@Component({
  selector: 'wl-bulk-deeds',
  template: `
    <span role="status" i18n>{selected().length, plural,
      =1 {one selected}
      other {{{ selected().length }} selected}
    }</span>
    @if (mayCheck()) {
      <button
        type="button"
        class="wl-button"
        [disabled]="busy() || !unchecked().length"
        (click)="check()"
        i18n
      >
        Mark as checked
      </button>
    }
    @if (mayAdopt()) {
      <button
        type="button"
        class="wl-button"
        [disabled]="busy() || !standing().length"
        (click)="adopt()"
        i18n
      >
        Adopt
      </button>
    }
    @if (mayJudge()) {
      <button
        type="button"
        class="wl-button"
        [disabled]="busy() || !countable().length"
        (click)="setAside()"
        i18n
      >
        Set aside
      </button>
    }
    @if (mayWithdraw()) {
      <button
        type="button"
        class="wl-button wl-severe"
        [disabled]="busy() || !standing().length"
        (click)="withdraw()"
        i18n
      >
        Withdraw
      </button>
    }
    <button type="button" class="wl-link" (click)="cleared.emit()" i18n>Select none</button>
  `,
  styles: `
    :host {
      display: flex;
      flex-wrap: wrap;
      align-items: center;
      gap: 8px 12px;
      padding: 8px 0;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class BulkDeeds {
  readonly programmeId = input.required<string>();
  readonly selected = input.required<readonly Result[]>();
  readonly inputOf = input.required<(resultId: string) => ResultInput | undefined>();
  /** The variants concerned, with the selected results chosen. */
  readonly targets = input.required<readonly AdoptionTarget[]>();
  readonly busy = input.required<boolean>();
  readonly decided = output<EvidenceDecision>();
  readonly cleared = output();

  private readonly session = inject(Session);
  private readonly injector = inject(Injector);
  protected readonly mayAdopt = computed(() => this.session.may('results.adopt'));
  protected readonly mayCheck = computed(() => this.session.may('results.check'));
  protected readonly mayJudge = computed(() => this.session.may('results.judge'));
  protected readonly mayWithdraw = computed(() => this.session.may('results.withdraw'));

  /** Whatever was withdrawn stays so: nothing is done with it any more. */
  protected readonly standing = computed(() =>
    this.selected().filter(({ withdrawn }) => withdrawn === undefined),
  );
  protected readonly unchecked = computed(() => this.selected().filter(({ state }) => state === 'entered'));
  protected readonly countable = computed(() =>
    this.standing().filter(({ judgement }) => judgement?.setAsideReason === undefined),
  );

  protected async check(): Promise<void> {
    const results = this.unchecked();
    await this.askThen(checkManyQuestion(results.length), (comment) => ({
      kind: 'check',
      resultIds: results.map(({ id }) => id),
      state: 'checked',
      comment,
    }));
  }

  protected async adopt(): Promise<void> {
    const question = { programmeId: this.programmeId(), targets: this.targets() };
    const decision = await runInInjectionContext(this.injector, () => decideAdoption(question));
    if (decision) this.decided.emit(decision);
  }

  protected async setAside(): Promise<void> {
    const results = this.countable();
    await this.askThen(setManyAsideQuestion(results.length), (setAsideReason) => ({
      kind: 'judge',
      judgements: results.map((result) =>
        judgementOrder(result, this.inputOf()(result.id), { setAsideReason }),
      ),
    }));
  }

  protected async withdraw(): Promise<void> {
    const results = this.standing();
    const names = results.map(({ name }) => name);
    await this.askThen(withdrawManyQuestion(names), (reason) => ({
      kind: 'withdraw',
      resultIds: results.map(({ id }) => id),
      reason,
    }));
  }

  private async askThen(
    question: Parameters<typeof askInDialog>[0],
    decision: (answer: string) => EvidenceDecision,
  ): Promise<void> {
    const answer = await runInInjectionContext(this.injector, () => askInDialog(question));
    if (answer !== undefined) this.decided.emit(decision(answer));
  }
}
