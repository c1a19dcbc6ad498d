import type { TestPlan, TestPlanFields } from '#shared/contracts/test-plans';
import type { Work } from '../../http/context';
import { fail } from '../../http/problem-error';
import { demandFound, demandFreeName, demandVersion, refuseUnusable } from '../../rules/refusals';
import { differences, recordAudit } from '../audit';
import { findFacility } from '../facilities';
import { policiesInForce } from '../policies';
import { programmeExists } from '../programmes';
import { findVariant } from '../variants';
import { planIssues, reasonNotToExpect, type PlanSurroundings } from './test-plans.policy';
import {
  findPlan,
  insertPlan,
  isResultOf,
  listPlans,
  lockPlan,
  planOfName,
  updatePlan,
  type PlanPlace,
} from './test-plans.repository';

export async function allPlans(work: Work, programmeId: string): Promise<readonly TestPlan[]> {
  await demandProgramme(work, programmeId);
  return listPlans(work.tx, programmeId);
}

export async function onePlan(work: Work, place: PlanPlace): Promise<TestPlan> {
  return demandFound(await findPlan(work.tx, place));
}

export async function savePlan(work: Work, programmeId: string, fields: TestPlanFields): Promise<TestPlan> {
  await demandProgramme(work, programmeId);
  refuseUnusable(planIssues(fields, await surroundingsOf(work, programmeId, fields)));
  demandFreeName(await planOfName(work.tx, programmeId, fields.name), undefined, fields.name);
  const testPlanId = await insertPlan(work, programmeId, fields);
  const plan = await onePlan(work, { programmeId, testPlanId });
  await record(work, 'test-plan.saved', {}, plan);
  return plan;
}

/** A plan from which results are expected stays expected: those to come are held against what it says now. */
export async function changePlan(
  work: Work,
  place: PlanPlace,
  fields: TestPlanFields,
  expectedVersion: number,
): Promise<TestPlan> {
  const before = demandFound(await lockPlan(work.tx, place));
  demandVersion(before, expectedVersion);
  refuseUnusable(planIssues(fields, await surroundingsOf(work, place.programmeId, fields)));
  demandFreeName(await planOfName(work.tx, place.programmeId, fields.name), before.id, fields.name);
  if (before.expectedSince !== undefined) await demandExpectable(work, { ...before, ...fields });
  await updatePlan(work.tx, before.id, fields);
  const after = await onePlan(work, place);
  await record(work, 'test-plan.changed', before, after);
  return after;
}

export async function expectPlan(
  work: Work,
  place: PlanPlace,
  expected: boolean,
  expectedVersion: number,
): Promise<TestPlan> {
  const before = demandFound(await lockPlan(work.tx, place));
  demandVersion(before, expectedVersion);
  if (expected) await demandExpectable(work, before);
  await updatePlan(work.tx, before.id, { expectedSince: expected ? work.now : null });
  const after = await onePlan(work, place);
  await record(work, expected ? 'test-plan.expected' : 'test-plan.expected-no-more', before, after);
  return after;
}

export async function retirePlan(
  work: Work,
  place: PlanPlace,
  retired: boolean,
  expectedVersion: number,
): Promise<TestPlan> {
  const before = demandFound(await lockPlan(work.tx, place));
  demandVersion(before, expectedVersion);
  await updatePlan(work.tx, before.id, { retiredAt: retired ? work.now : null, expectedSince: null });
  const after = await onePlan(work, place);
  await record(work, retired ? 'test-plan.retired' : 'test-plan.brought-back', before, after);
  return after;
}

async function demandExpectable(work: Work, plan: TestPlan): Promise<void> {
  const { values } = await policiesInForce(work.tx);
  const detail = reasonNotToExpect(plan, values.machExcluded);
  if (detail !== undefined) fail('wrong-state', { detail });
}

async function demandProgramme(work: Work, programmeId: string): Promise<void> {
  if (!(await programmeExists(work.tx, programmeId))) fail('not-found');
}

async function surroundingsOf(
  work: Work,
  programmeId: string,
  { variantId, facilityId, inputs }: TestPlanFields,
): Promise<PlanSurroundings> {
  const { target } = inputs;
  return {
    variantFound: (await findVariant(work.tx, programmeId, variantId)) !== undefined,
    facility: await findFacility(work.tx, facilityId),
    sweepFound: target.basis !== 'sweep' || (await isResultOf(work.tx, programmeId, target.resultId)),
  };
}

async function record(work: Work, action: string, before: Partial<TestPlan>, after: TestPlan): Promise<void> {
  await recordAudit(work, {
    action,
    entityKind: 'test-plan',
    entityId: after.id,
    summary: differences(before, after),
  });
}
