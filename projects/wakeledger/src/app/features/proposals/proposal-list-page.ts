import { DatePipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { rxResource } from '@angular/core/rxjs-interop';
import { RouterLink } from '@angular/router';
import { asApiProblem } from '../../core/api/api-problem';
import { ProposalsApi } from '../../data/proposals/proposals-api';
import { Busy } from '../../ui/busy/busy';
import { EmptyState } from '../../ui/empty-state/empty-state';
import { ProblemBanner } from '../../ui/problem-banner/problem-banner';
import { STATE_WORDS } from './proposal-words';

/** Which changes of judgement wait for a colleague? Open ones first. */
@Component({
  selector: 'wl-proposal-list-page',
  imports: [Busy, DatePipe, EmptyState, ProblemBanner, RouterLink],
  templateUrl: './proposal-list-page.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ProposalListPage {
  readonly programmeId = input.required<string>();

  private readonly api = inject(ProposalsApi);
  protected readonly proposals = rxResource({
    params: () => this.programmeId(),
    stream: ({ params }) => this.api.list(params),
  });
  protected readonly problem = computed(() => {
    const error = this.proposals.error();
    return error ? asApiProblem(error.cause ?? error) : undefined;
  });
  protected readonly rows = computed(() => {
    const all = this.proposals.hasValue() ? this.proposals.value() : [];
    const open = all.filter(({ state }) => state === 'open');
    return [...open, ...all.filter(({ state }) => state !== 'open')].map((proposal) => ({
      ...proposal,
      words: STATE_WORDS[proposal.state],
      count: proposal.changes.length,
      link: ['/programmes', this.programmeId(), 'proposals', proposal.id],
    }));
  });

  protected retry(): void {
    this.proposals.reload();
  }
}
