import { Injectable, inject } from '@angular/core';
import { type Observable, map } from 'rxjs';
import {
  type CheckMeasurement,
  type CheckMeasurementFields,
  type TestSession,
  type TestSessionFields,
  checkMeasurementEnter,
  checkMeasurementList,
  checkMeasurementStrike,
  testSessionCreate,
  testSessionList,
  testSessionRead,
  testSessionUpdate,
} from '#shared/contracts/test-sessions';
import { ApiClient } from '../../core/api/api-client';

type Known = Pick<TestSession, 'id' | 'facilityId' | 'version'>;

/** The sessions of a facility and what its check body measured in them. Every call fails with an `ApiProblem`. */
@Injectable({ providedIn: 'root' })
export class TestSessionsApi {
  private readonly api = inject(ApiClient);

  /** Newest first. */
  list(facilityId: string): Observable<readonly TestSession[]> {
    return this.api.call(testSessionList, { params: { facilityId } }).pipe(map((answer) => answer.sessions));
  }

  read({ facilityId, id: testSessionId }: Pick<TestSession, 'id' | 'facilityId'>): Observable<TestSession> {
    return this.api.call(testSessionRead, { params: { facilityId, testSessionId } });
  }

  create(facilityId: string, body: TestSessionFields, commandKey: string): Observable<TestSession> {
    return this.api.call(testSessionCreate, { params: { facilityId }, body, commandKey });
  }

  update(
    { facilityId, id: testSessionId, version: ifMatch }: Known,
    body: TestSessionFields,
    commandKey: string,
  ): Observable<TestSession> {
    return this.api.call(testSessionUpdate, {
      params: { facilityId, testSessionId },
      body,
      ifMatch,
      commandKey,
    });
  }

  /** By date, those struck out included. */
  measurements(facilityId: string): Observable<readonly CheckMeasurement[]> {
    return this.api
      .call(checkMeasurementList, { params: { facilityId } })
      .pipe(map((answer) => answer.measurements));
  }

  enter(facilityId: string, body: CheckMeasurementFields, commandKey: string): Observable<CheckMeasurement> {
    return this.api.call(checkMeasurementEnter, { params: { facilityId }, body, commandKey });
  }

  strike(facilityId: string, checkMeasurementId: string, reason: string): Observable<CheckMeasurement> {
    return this.api.call(checkMeasurementStrike, {
      params: { facilityId, checkMeasurementId },
      body: { reason },
    });
  }
}
