import { Injectable, inject } from '@angular/core';
import { type Observable, catchError, forkJoin, map, of } from 'rxjs';
import { type Programme, programmeRead } from '#shared/contracts/programmes';
import { rankingInputsRead } from '#shared/contracts/rankings';
import {
  type Adoption,
  type Evaluation,
  adoptionList,
  evaluationList,
  evidenceAdopt,
} from '#shared/contracts/adoptions';
import { resultsJudge } from '#shared/contracts/judgements';
import {
  type Result,
  type ResultEvent,
  type ResultFields,
  resultEnter,
  resultHistory,
  resultList,
  resultsCheck,
  resultsWithdraw,
} from '#shared/contracts/results';
import type { RankingInput } from '#shared/core/ranking/ranking-input';
import { ApiClient } from '../../core/api/api-client';
import { ApiProblem, asApiProblem } from '../../core/api/api-problem';
import type { EvidenceDecision, EvidenceDone } from './evidence-decision';

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

  /** Carries out a decision, all of it or nothing. */
  decide(programmeId: string, decision: EvidenceDecision): Observable<EvidenceDone> {
    const params = { programmeId };
    switch (decision.kind) {
      case 'check': {
        const { resultIds, state, comment } = decision;
        return this.api
          .call(resultsCheck, { params, body: { resultIds: [...resultIds], state, comment } })
          .pipe(map(({ results }) => ({ kind: 'checked', results, state })));
      }
      case 'judge': {
        const { judgements, comment } = decision;
        return this.api
          .call(resultsJudge, { params, body: { judgements: [...judgements], comment } })
          .pipe(map((answer) => ({ kind: 'judged', judgements: answer.judgements })));
      }
      case 'adopt': {
        const { adoptions, comment } = decision;
        return this.api
          .call(evidenceAdopt, { params, body: { adoptions: [...adoptions], comment } })
          .pipe(map((answer) => ({ kind: 'adopted', adoptions: answer.adoptions })));
      }
      case 'withdraw': {
        const { resultIds, reason } = decision;
        return this.api
          .call(resultsWithdraw, { params, body: { resultIds: [...resultIds], reason } })
          .pipe(map(({ results }) => ({ kind: 'withdrawn', results })));
      }
    }
  }

  /** What happened to a result, newest first. */
  history(programmeId: string, resultId: string): Observable<readonly ResultEvent[]> {
    return this.api
      .call(resultHistory, { params: { programmeId, resultId } })
      .pipe(map(({ events }) => events));
  }

  /** What the adoptions of a variant came to when they were made, and come to now; newest first. */
  evaluations(programmeId: string, variantId: string): Observable<readonly Evaluation[]> {
    return this.api
      .call(evaluationList, { params: { programmeId, variantId } })
      .pipe(map(({ evaluations }) => evaluations));
  }
}
