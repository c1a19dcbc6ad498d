import { Injectable, inject } from '@angular/core';
import { type Observable, map } from 'rxjs';
import {
  type Adoption,
  type Result,
  type ResultFields,
  adoptionList,
  resultAdopt,
  resultEnter,
  resultList,
  resultWithdraw,
} from '#shared/contracts/results';
import { ApiClient } from '../../core/api/api-client';

/** What a person decides when a result is adopted, or an adoption is released (`resultId` absent). */
export interface AdoptionOrder {
  readonly variantId: string;
  readonly resultId?: string;
  readonly comment: string;
  readonly expectedCurrentResultId?: string;
}

/** Results and adoptions, as the server keeps them. Every call fails with an `ApiProblem`. */
@Injectable({ providedIn: 'root' })
export class ResultsApi {
  private readonly api = inject(ApiClient);

  list(programmeId: string): Observable<readonly Result[]> {
    return this.api.call(resultList, { params: { programmeId } }).pipe(map((answer) => answer.results));
  }

  adoptions(programmeId: string): Observable<readonly Adoption[]> {
    return this.api.call(adoptionList, { params: { programmeId } }).pipe(map((answer) => answer.adoptions));
  }

  enter(programmeId: string, body: ResultFields, commandKey: string): Observable<Result> {
    return this.api.call(resultEnter, { params: { programmeId }, body, commandKey });
  }

  adopt(programmeId: string, order: AdoptionOrder): Observable<Adoption> {
    return this.api.call(resultAdopt, { params: { programmeId }, body: order });
  }

  withdraw(programmeId: string, resultId: string, reason: string): Observable<Result> {
    return this.api.call(resultWithdraw, { params: { programmeId, resultId }, body: { reason } });
  }
}
