import { Injectable, inject } from '@angular/core';
import { type Observable, catchError, forkJoin, map, of } from 'rxjs';
import { type PolicyValues, type PolicyVersion, policiesRead } from '#shared/contracts/policies';
import { type Programme, programmeRead } from '#shared/contracts/programmes';
import { rankingInputsRead } from '#shared/contracts/rankings';
import { type Result, resultList } from '#shared/contracts/results';
import {
  type TestPlan,
  type TestPlanFields,
  testPlanCreate,
  testPlanExpect,
  testPlanList,
  testPlanRead,
  testPlanRetire,
  testPlanUpdate,
} from '#shared/contracts/test-plans';
import type { RankingInput } from '#shared/core/ranking/ranking-input';
import { ApiClient } from '../../core/api/api-client';
import { ApiProblem } from '../../core/api/api-problem';

/** What a test is planned against: the programme's reference and the organisation's limits. */
export interface PlanningGround {
  readonly programme: Programme;
  /** Those in force. */
  readonly policies: PolicyValues;
}

type Known = Pick<TestPlan, 'id' | 'programmeId' | 'version'>;

const place = ({ id: testPlanId, programmeId }: Pick<TestPlan, 'id' | 'programmeId'>) => ({
  programmeId,
  testPlanId,
});

/** @throws {ApiProblem} unreadable-answer where there is none, which the contract rules out */
function inForce([newest]: readonly PolicyVersion[]): PolicyValues {
  if (newest === undefined) throw new ApiProblem('unreadable-answer');
  return newest.values;
}

/** Planned tests, and what planning needs to know. Every call fails with an `ApiProblem`. */
@Injectable({ providedIn: 'root' })
export class TestPlansApi {
  private readonly api = inject(ApiClient);

  list(programmeId: string): Observable<readonly TestPlan[]> {
    return this.api.call(testPlanList, { params: { programmeId } }).pipe(map((answer) => answer.plans));
  }

  read(programmeId: string, testPlanId: string): Observable<TestPlan> {
    return this.api.call(testPlanRead, { params: { programmeId, testPlanId } });
  }

  create(programmeId: string, body: TestPlanFields, commandKey: string): Observable<TestPlan> {
    return this.api.call(testPlanCreate, { params: { programmeId }, body, commandKey });
  }

  update(plan: Known, body: TestPlanFields, commandKey: string): Observable<TestPlan> {
    return this.api.call(testPlanUpdate, { params: place(plan), body, ifMatch: plan.version, commandKey });
  }

  expect(plan: Known, expected: boolean): Observable<TestPlan> {
    return this.api.call(testPlanExpect, { params: place(plan), body: { expected }, ifMatch: plan.version });
  }

  retire(plan: Known, retired: boolean): Observable<TestPlan> {
    return this.api.call(testPlanRetire, { params: place(plan), body: { retired }, ifMatch: plan.version });
  }

  ground(programmeId: string): Observable<PlanningGround> {
    return forkJoin({
      programme: this.api.call(programmeRead, { params: { programmeId } }),
      policies: this.api.call(policiesRead, {}).pipe(map(({ versions }) => inForce(versions))),
    });
  }

  /** What the programme's evidence is reduced from; null where the server cannot give it, for example without an area. */
  evidence(programmeId: string): Observable<RankingInput | null> {
    return this.api
      .call(rankingInputsRead, { params: { programmeId }, query: { evidence: 'all' } })
      .pipe(catchError(() => of(null)));
  }

  results(programmeId: string): Observable<readonly Result[]> {
    return this.api.call(resultList, { params: { programmeId } }).pipe(map((answer) => answer.results));
  }
}
