import { Injectable, inject } from '@angular/core';
import { type Observable, map } from 'rxjs';
import {
  type Facility,
  type FacilityChange,
  type FacilityEvidence,
  type FacilityFields,
  type FacilityVersion,
  type TestedModel,
  facilityCreate,
  facilityEvidenceList,
  facilityList,
  facilityModelList,
  facilityRead,
  facilityRetire,
  facilityUpdate,
  facilityVersionList,
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
    body: FacilityChange,
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

  /** Newest first. */
  versions(facilityId: string): Observable<readonly FacilityVersion[]> {
    return this.api
      .call(facilityVersionList, { params: { facilityId } })
      .pipe(map((answer) => answer.versions));
  }

  evidence(facilityId: string): Observable<readonly FacilityEvidence[]> {
    return this.api
      .call(facilityEvidenceList, { params: { facilityId } })
      .pipe(map((answer) => answer.programmes));
  }

  /** Largest first; for those who may read results. */
  models(facilityId: string): Observable<readonly TestedModel[]> {
    return this.api.call(facilityModelList, { params: { facilityId } }).pipe(map((answer) => answer.models));
  }
}
