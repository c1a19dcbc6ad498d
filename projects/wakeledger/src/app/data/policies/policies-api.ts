import { Injectable, inject } from '@angular/core';
import { type Observable, map } from 'rxjs';
import type * as z from 'zod';
import { policiesChange, policiesRead, type PolicyVersion } from '#shared/contracts/policies';
import { ApiClient } from '../../core/api/api-client';

export type PolicyChange = z.input<typeof policiesChange.body>;

/** What the organisation holds for acceptable, as the server keeps it. Every call fails with an `ApiProblem`. */
@Injectable({ providedIn: 'root' })
export class PoliciesApi {
  private readonly api = inject(ApiClient);

  /** Newest first; the first is in force. */
  list(): Observable<readonly PolicyVersion[]> {
    return this.api.call(policiesRead, {}).pipe(map(({ versions }) => versions));
  }

  change(change: PolicyChange, commandKey: string): Observable<PolicyVersion> {
    return this.api.call(policiesChange, { body: change, commandKey });
  }
}
