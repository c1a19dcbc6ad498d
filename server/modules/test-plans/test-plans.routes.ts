import {
  testPlanCreate,
  testPlanExpect,
  testPlanList,
  testPlanRead,
  testPlanRetire,
  testPlanUpdate,
} from '#shared/contracts/test-plans';
import { route, type Route } from '../../http/module';
import { allPlans, changePlan, expectPlan, onePlan, retirePlan, savePlan } from './test-plans.service';

export const testPlansRoutes: readonly Route[] = [
  route(testPlanList, async ({ params }, work) => ({
    plans: [...(await allPlans(work, params.programmeId))],
  })),
  route(testPlanRead, async ({ params }, work) => onePlan(work, params)),
  route(testPlanCreate, async ({ params, body }, work) => savePlan(work, params.programmeId, body)),
  route(testPlanUpdate, async ({ params, body, expectedVersion }, work) =>
    changePlan(work, params, body, expectedVersion),
  ),
  route(testPlanExpect, async ({ params, body, expectedVersion }, work) =>
    expectPlan(work, params, body.expected, expectedVersion),
  ),
  route(testPlanRetire, async ({ params, body, expectedVersion }, work) =>
    retirePlan(work, params, body.retired, expectedVersion),
  ),
];
