import { Injectable, inject } from '@angular/core';
import { type Observable, map } from 'rxjs';
import type * as z from 'zod';
import {
  type Correlation,
  type CorrelationReplaces,
  type CorrelationSummary,
  candidatePairList,
  correlationAdopt,
  correlationCreate,
  correlationEnd,
  correlationList,
  correlationRead,
  correlationVersionAdd,
} from '#shared/contracts/correlations';
import { ApiClient } from '../../core/api/api-client';

export type NewCorrelation = z.input<(typeof correlationCreate)['body']>;
export type NewVersion = z.input<(typeof correlationVersionAdd)['body']>;
export type AdoptionOrder = z.input<(typeof correlationAdopt)['body']>;
export type EndingOrder = z.input<(typeof correlationEnd)['body']>;
export type CandidatePairs = z.output<(typeof candidatePairList)['response']>;

/** Which pairs are asked for. */
export interface PairQuestion {
  readonly facilityId: string;
  readonly referenceFacilityId: string;
  readonly replaces: readonly CorrelationReplaces[];
}

/** How facilities are brought to one another. Every call fails with an `ApiProblem`. */
@Injectable({ providedIn: 'root' })
export class CorrelationsApi {
  private readonly api = inject(ApiClient);

  list(): Observable<readonly CorrelationSummary[]> {
    return this.api.call(correlationList, {}).pipe(map((answer) => answer.correlations));
  }

  read(correlationId: string): Observable<Correlation> {
    return this.api.call(correlationRead, { params: { correlationId } });
  }

  pairs({ facilityId, referenceFacilityId, replaces }: PairQuestion): Observable<CandidatePairs> {
    return this.api.call(candidatePairList, {
      query: {
        facilityId,
        referenceFacilityId,
        ...(replaces.length ? { replaces: replaces.join(',') } : {}),
      },
    });
  }

  create(body: NewCorrelation, commandKey: string): Observable<Correlation> {
    return this.api.call(correlationCreate, { body, commandKey });
  }

  addVersion(correlationId: string, body: NewVersion, commandKey: string): Observable<Correlation> {
    return this.api.call(correlationVersionAdd, { params: { correlationId }, body, commandKey });
  }

  adopt(correlationId: string, body: AdoptionOrder, commandKey: string): Observable<Correlation> {
    return this.api.call(correlationAdopt, { params: { correlationId }, body, commandKey });
  }

  end(correlationId: string, body: EndingOrder, commandKey: string): Observable<Correlation> {
    return this.api.call(correlationEnd, { params: { correlationId }, body, commandKey });
  }
}
