import { Injectable, inject } from '@angular/core';
import { type Observable, map } from 'rxjs';
import type * as z from 'zod';
import {
  proposalAccept,
  proposalDrop,
  proposalList,
  proposalMake,
  proposalRead,
  type Proposal,
  type ProposalSummary,
} from '#shared/contracts/proposals';
import { ApiClient } from '../../core/api/api-client';

export type NewProposal = z.input<typeof proposalMake.body>;

/** Changes of judgement before colleagues, as the server keeps them. Every call fails with an `ApiProblem`. */
@Injectable({ providedIn: 'root' })
export class ProposalsApi {
  private readonly api = inject(ApiClient);

  /** Newest first. */
  list(programmeId: string): Observable<readonly ProposalSummary[]> {
    return this.api.call(proposalList, { params: { programmeId } }).pipe(map(({ proposals }) => proposals));
  }

  read(programmeId: string, proposalId: string): Observable<Proposal> {
    return this.api.call(proposalRead, { params: { programmeId, proposalId } });
  }

  make(programmeId: string, body: NewProposal, commandKey: string): Observable<Proposal> {
    return this.api.call(proposalMake, { params: { programmeId }, body, commandKey });
  }

  accept(programmeId: string, proposalId: string, comment: string): Observable<Proposal> {
    return this.api.call(proposalAccept, { params: { programmeId, proposalId }, body: { comment } });
  }

  drop(programmeId: string, proposalId: string, comment: string): Observable<Proposal> {
    return this.api.call(proposalDrop, { params: { programmeId, proposalId }, body: { comment } });
  }
}
