import { Injectable, inject } from '@angular/core';
import { type Observable, map } from 'rxjs';
import {
  type Facility,
  type FacilityFields,
  facilityCreate,
  facilityList,
  facilityRead,
  facilityRetire,
  facilityUpdate,
} from '#shared/contracts/facilities';
import { ApiClient } from '../../core/api/api-client';

/** The organisation's facilities, as the server keeps them. Every call fails with an `ApiProblem`. */
@Injectable({ providedIn: 'root' })
export class FacilitiesApi {
  private readonly api = inject(ApiClient);

  list(): Observable<readonly Facility[]> {
    return this.api.call(facilityList, {}).pipe(map((answer) => answer.facilities));
  }

  read(facilityId: string): Observable<Facility> {
    return this.api.call(facilityRead, { params: { facilityId } });
  }

  create(body: FacilityFields, commandKey: string): Observable<Facility> {
    return this.api.call(facilityCreate, { body, commandKey });
  }

  update(
    { id: facilityId, version: ifMatch }: Pick<Facility, 'id' | 'version'>,
    body: FacilityFields,
    commandKey: string,
  ): Observable<Facility> {
    return this.api.call(facilityUpdate, { params: { facilityId }, body, ifMatch, commandKey });
  }

  retire(
    { id: facilityId, version: ifMatch }: Pick<Facility, 'id' | 'version'>,
    retired: boolean,
  ): Observable<Facility> {
    return this.api.call(facilityRetire, { params: { facilityId }, body: { retired }, ifMatch });
  }
}
