import { Injectable, inject } from '@angular/core';
import { type Observable, map } from 'rxjs';
import type * as z from 'zod';
import {
  type CycleDetail,
  type CycleSummary,
  cycleCreate,
  cycleList,
  cycleRead,
  cycleRetire,
} from '#shared/contracts/cycles';
import { ApiClient } from '../../core/api/api-client';

export type CycleFile = Omit<z.input<typeof cycleCreate.body>, 'checkOnly'>;

/** The speed traces for energy, as the server keeps them. Every call fails with an `ApiProblem`. */
@Injectable({ providedIn: 'root' })
export class CyclesApi {
  private readonly api = inject(ApiClient);

  list(): Observable<readonly CycleSummary[]> {
    return this.api.call(cycleList, {}).pipe(map((answer) => answer.cycles));
  }

  read(cycleKey: string): Observable<CycleDetail> {
    return this.api.call(cycleRead, { params: { cycleKey } });
  }

  /** Reads the file as it would be stored, and stores nothing. */
  check(file: CycleFile): Observable<CycleDetail> {
    return this.api.call(cycleCreate, { body: { ...file, checkOnly: true } });
  }

  store(file: CycleFile, commandKey: string): Observable<CycleDetail> {
    return this.api.call(cycleCreate, { body: { ...file, checkOnly: false }, commandKey });
  }

  retire(cycleKey: string, retired: boolean): Observable<CycleSummary> {
    return this.api.call(cycleRetire, { params: { cycleKey }, body: { retired } });
  }
}
