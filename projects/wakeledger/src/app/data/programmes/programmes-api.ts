import { Injectable, inject } from '@angular/core';
import { type Observable, map } from 'rxjs';
import {
  type Programme,
  type ProgrammeFields,
  type ProgrammeSummary,
  programmeCreate,
  programmeList,
  programmeOpened,
  programmeRead,
  programmeRetire,
  programmeUpdate,
} from '#shared/contracts/programmes';
import { ApiClient } from '../../core/api/api-client';

type Edited = Pick<Programme, 'id' | 'version'>;

/** The organisation's programmes, as the server keeps them. Every call fails with an `ApiProblem`. */
@Injectable({ providedIn: 'root' })
export class ProgrammesApi {
  private readonly api = inject(ApiClient);

  list(): Observable<readonly ProgrammeSummary[]> {
    return this.api.call(programmeList, {}).pipe(map((answer) => answer.programmes));
  }

  read(programmeId: string): Observable<Programme> {
    return this.api.call(programmeRead, { params: { programmeId } });
  }

  /** Remembers where the next sign-in leads. */
  opened(programmeId: string): Observable<unknown> {
    return this.api.call(programmeOpened, { params: { programmeId } });
  }

  create(body: ProgrammeFields, commandKey: string): Observable<Programme> {
    return this.api.call(programmeCreate, { body, commandKey });
  }

  update({ id, version }: Edited, body: ProgrammeFields, commandKey: string): Observable<Programme> {
    return this.api.call(programmeUpdate, {
      params: { programmeId: id },
      body,
      ifMatch: version,
      commandKey,
    });
  }

  retire({ id, version }: Edited, retired: boolean): Observable<Programme> {
    return this.api.call(programmeRetire, {
      params: { programmeId: id },
      body: { retired },
      ifMatch: version,
    });
  }
}
