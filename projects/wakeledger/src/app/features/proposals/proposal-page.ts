import { DatePipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, computed, inject, input, signal } from '@angular/core';
import { rxResource } from '@angular/core/rxjs-interop';
import { RouterLink } from '@angular/router';
import { type Observable, firstValueFrom } from 'rxjs';
import type { Proposal } from '#shared/contracts/proposals';
import { type ApiProblem, asApiProblem } from '../../core/api/api-problem';
import { Undo } from '../../core/editing/undo';
import { Session } from '../../core/session/session';
import { ProposalsApi } from '../../data/proposals/proposals-api';
import { Busy } from '../../ui/busy/busy';
import { ProblemBanner } from '../../ui/problem-banner/problem-banner';
import { QuantityFormat } from '../../ui/quantity/quantity-format';
import { RankingMoves } from '../../ui/ranking-moves/ranking-moves';
import { changeWords } from '../../ui/words/change-words';
import { proposedSubjects, STATE_WORDS } from './proposal-words';

/** Shall this change of judgement hold? What changes, what it comes to, and the decision. */
@Component({
  selector: 'wl-proposal-page',
  imports: [Busy, DatePipe, ProblemBanner, RankingMoves, RouterLink],
  templateUrl: './proposal-page.html',
  styleUrl: './proposal-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ProposalPage {
  readonly programmeId = input.required<string>();
  readonly proposalId = input.required<string>();

  private readonly api = inject(ProposalsApi);
  private readonly session = inject(Session);
  private readonly undo = inject(Undo);
  private readonly format = inject(QuantityFormat);
  protected readonly read = rxResource({
    params: () => ({ programmeId: this.programmeId(), proposalId: this.proposalId() }),
    stream: ({ params }) => this.api.read(params.programmeId, params.proposalId),
  });
  protected readonly comment = signal('');
  protected readonly busy = signal(false);
  private readonly refused = signal<ApiProblem | undefined>(undefined);
  protected readonly problem = computed(() => {
    const error = this.read.error();
    return error ? asApiProblem(error.cause ?? error) : this.refused();
  });
  protected readonly proposal = computed(() => (this.read.hasValue() ? this.read.value() : undefined));
  protected readonly state = computed(() => {
    const proposal = this.proposal();
    return proposal && STATE_WORDS[proposal.state];
  });
  protected readonly lines = computed(() => {
    const proposal = this.proposal();
    if (proposal === undefined) return [];
    const subjects = proposedSubjects(proposal);
    return proposal.changes.map((change, position) => ({
      words: changeWords(change, subjects, this.format),
      moved: proposal.moved
        .filter(({ where }) => where === `changes.${position}`)
        .map(({ detail }) => detail),
    }));
  });
  /** Whether today's outcome is another one than the proposer saw. */
  protected readonly differs = computed(() => {
    const { now, outcome } = this.proposal() ?? {};
    return now !== undefined && JSON.stringify(now) !== JSON.stringify(outcome?.comparison);
  });
  protected readonly mayAccept = computed(
    () => this.session.may('proposals.decide') && this.proposal()?.byYou === false,
  );
  protected readonly mayDrop = computed(
    () => this.session.may('proposals.decide') || this.proposal()?.byYou === true,
  );
  protected readonly commented = computed(() => this.comment().trim().length >= 3 && !this.busy());

  protected accept(): Promise<void> {
    return this.decide(
      this.api.accept(this.programmeId(), this.proposalId(), this.comment().trim()),
      $localize`Accepted: every change holds now.`,
    );
  }

  protected drop(): Promise<void> {
    return this.decide(
      this.api.drop(this.programmeId(), this.proposalId(), this.comment().trim()),
      $localize`Dropped: nothing was changed.`,
    );
  }

  protected retry(): void {
    this.refused.set(undefined);
    this.read.reload();
  }

  /** After a refusal the page is read anew, so that it says what moved. */
  private async decide(deed: Observable<Proposal>, done: string): Promise<void> {
    this.busy.set(true);
    this.refused.set(undefined);
    try {
      this.read.set(await firstValueFrom(deed));
      this.undo.say(done);
    } catch (error) {
      this.refused.set(asApiProblem(error));
      this.read.reload();
    } finally {
      this.busy.set(false);
    }
  }
}
