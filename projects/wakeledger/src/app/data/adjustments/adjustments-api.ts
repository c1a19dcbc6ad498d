import { Injectable, inject } from '@angular/core';
import { type Observable, map } from 'rxjs';
import {
  type Adjustment,
  type AdjustmentFields,
  adjustmentCreate,
  adjustmentList,
  adjustmentRead,
  adjustmentRetire,
  adjustmentUpdate,
} from '#shared/contracts/adjustments';
import { ApiClient } from '../../core/api/api-client';

/** What differences of the test condition are worth. Every call fails with an `ApiProblem`. */
@Injectable({ providedIn: 'root' })
export class AdjustmentsApi {
  private readonly api = inject(ApiClient);

  /** In the order in which the first that fits is used; retired ones last. */
  list(): Observable<readonly Adjustment[]> {
    return this.api.call(adjustmentList, {}).pipe(map((answer) => answer.adjustments));
  }

  read(adjustmentId: string): Observable<Adjustment> {
    return this.api.call(adjustmentRead, { params: { adjustmentId } });
  }

  create(body: AdjustmentFields, commandKey: string): Observable<Adjustment> {
    return this.api.call(adjustmentCreate, { body, commandKey });
  }

  update(
    { id: adjustmentId, version: ifMatch }: Pick<Adjustment, 'id' | 'version'>,
    body: AdjustmentFields,
    commandKey: string,
  ): Observable<Adjustment> {
    return this.api.call(adjustmentUpdate, { params: { adjustmentId }, body, ifMatch, commandKey });
  }

  retire(
    { id: adjustmentId, version: ifMatch }: Pick<Adjustment, 'id' | 'version'>,
    retired: boolean,
  ): Observable<Adjustment> {
    return this.api.call(adjustmentRetire, { params: { adjustmentId }, body: { retired }, ifMatch });
  }
}
