import { Injectable, inject } from '@angular/core';
import { type Observable, catchError, forkJoin, map, of } from 'rxjs';
import { type Programme, programmeRead } from '#shared/contracts/programmes';
import { rankingInputsRead } from '#shared/contracts/rankings';
import { type Adoption, type AdoptionOrder, adoptionList, evidenceAdopt } from '#shared/contracts/adoptions';
import {
  type Result,
  type ResultFields,
  resultEnter,
  resultList,
  resultWithdraw,
} from '#shared/contracts/results';
import type { RankingInput } from '#shared/core/ranking/ranking-input';
import { ApiClient } from '../../core/api/api-client';
import { ApiProblem, asApiProblem } from '../../core/api/api-problem';

/** What a person decides when evidence is adopted, or an adoption is released (no results). */
export interface AdoptionDecision extends AdoptionOrder {
  readonly comment: string;
}

export interface EvidenceAnswer {
  readonly programme: Programme;
  readonly results: readonly Result[];
  /** Newest first. */
  readonly adoptions: readonly Adoption[];
  /** What the results are reduced with; null where the server could not give it, and why. */
  readonly inputs: RankingInput | null;
  readonly inputsProblem: ApiProblem | null;
}

/** Results and adoptions, as the server keeps them. Every call fails with an `ApiProblem`. */
@Injectable({ providedIn: 'root' })
export class ResultsApi {
  private readonly api = inject(ApiClient);

  /** Everything that the pages of the results read. Without a common area the inputs are refused; the rest is shown. */
  evidence(programmeId: string): Observable<EvidenceAnswer> {
    const params = { programmeId };
    const inputs = this.api
      .call(rankingInputsRead, { params, query: { evidence: 'all' } })
      .pipe(catchError((error: unknown) => of(asApiProblem(error))));
    return forkJoin({
      programme: this.api.call(programmeRead, { params }),
      results: this.api.call(resultList, { params }).pipe(map((answer) => answer.results)),
      adoptions: this.api.call(adoptionList, { params }).pipe(map((answer) => answer.adoptions)),
      inputs,
    }).pipe(
      map(({ inputs: answer, ...rest }) =>
        answer instanceof ApiProblem
          ? { ...rest, inputs: null, inputsProblem: answer }
          : { ...rest, inputs: answer, inputsProblem: null },
      ),
    );
  }

  enter(programmeId: string, body: ResultFields, commandKey: string): Observable<Result> {
    return this.api.call(resultEnter, { params: { programmeId }, body, commandKey });
  }

  adopt(programmeId: string, { comment, ...order }: AdoptionDecision): Observable<readonly Adoption[]> {
    return this.api
      .call(evidenceAdopt, { params: { programmeId }, body: { adoptions: [order], comment } })
      .pipe(map(({ adoptions }) => adoptions));
  }

  withdraw(programmeId: string, resultId: string, reason: string): Observable<Result> {
    return this.api.call(resultWithdraw, { params: { programmeId, resultId }, body: { reason } });
  }
}
