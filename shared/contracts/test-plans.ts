import * as z from 'zod';
import { condition } from './condition';
import { id, name, nothing, positive, programmeParams, remark, timestamp, version } from './common';
import { endpoint } from './endpoint';

/**
 * The Reynolds number that a test is to reach: that of the full-size vehicle at the programme's reference, a typed one,
 * or the lowest that a measured sweep says can be accepted.
 */
export const planTarget = z.discriminatedUnion('basis', [
  z.strictObject({ basis: z.literal('reference') }),
  z.strictObject({ basis: z.literal('typed'), reynolds: positive }),
  z.strictObject({ basis: z.literal('sweep'), reynolds: positive, resultId: id }),
]);
export type PlanTarget = z.infer<typeof planTarget>;

/** What a test is planned with; variant and facility are named beside it. */
export const testPlanInputs = z.strictObject({
  scale: z.number().positive().max(1),
  target: planTarget,
  speedKmh: positive.max(1500).optional().describe('The speed that is settled on'),
  tunnelTemperatureC: z.number(),
  tunnelPressurePa: positive,
  maximumSpeedKmh: positive.max(1500).optional().describe('What the facility reaches with this model'),
  maximumForceN: positive.optional().describe('What the force balance carries'),
  frontalAreaM2: positive.max(20).describe('Of the full-size vehicle, as it was when the test was planned'),
  dragCoefficient: positive.max(5),
  coefficientAreaM2: positive.max(20).optional().describe('Full scale; the frontal area where it is absent'),
  coolingGas: z.enum(['air', 'nitrogen']).optional(),
  turbulence: z.boolean().optional().describe('Added turbulence or trips are planned'),
  condition,
  remark: remark.optional(),
});
export type TestPlanInputs = z.infer<typeof testPlanInputs>;

export const testPlanFields = z.strictObject({ name, variantId: id, facilityId: id, inputs: testPlanInputs });
export type TestPlanFields = z.infer<typeof testPlanFields>;

export const testPlan = testPlanFields.extend({
  id,
  programmeId: id,
  version,
  createdAt: timestamp,
  createdBy: name,
  expectedSince: timestamp.optional().describe('Since then results to come are held against it'),
  retiredAt: timestamp.optional(),
});
export type TestPlan = z.infer<typeof testPlan>;

/** A plan's state, from what is written down of it. */
export const PLAN_STATES = ['draft', 'expected', 'retired'] as const;
export type PlanState = (typeof PLAN_STATES)[number];

const planParams = programmeParams.extend({ testPlanId: id });

export const testPlanList = endpoint({
  kind: 'json',
  method: 'GET',
  path: '/api/v1/programmes/:programmeId/test-plans',
  summary: 'The planned tests of a programme, retired ones last',
  access: 'plans.read',
  params: programmeParams,
  query: nothing,
  body: nothing,
  response: z.strictObject({ plans: z.array(testPlan) }),
  command: false,
  versioned: false,
  problems: [],
});

export const testPlanRead = endpoint({
  kind: 'json',
  method: 'GET',
  path: '/api/v1/programmes/:programmeId/test-plans/:testPlanId',
  summary: 'One planned test',
  access: 'plans.read',
  params: planParams,
  query: nothing,
  body: nothing,
  response: testPlan,
  command: false,
  versioned: false,
  problems: [],
});

export const testPlanCreate = endpoint({
  kind: 'json',
  method: 'POST',
  path: '/api/v1/programmes/:programmeId/test-plans',
  summary: 'Save a planned test',
  access: 'plans.edit',
  params: programmeParams,
  query: nothing,
  body: testPlanFields,
  response: testPlan,
  command: true,
  versioned: false,
  problems: ['already-exists', 'unusable-input'],
});

export const testPlanUpdate = endpoint({
  kind: 'json',
  method: 'PUT',
  path: '/api/v1/programmes/:programmeId/test-plans/:testPlanId',
  summary: 'Change a planned test',
  access: 'plans.edit',
  params: planParams,
  query: nothing,
  body: testPlanFields,
  response: testPlan,
  command: true,
  versioned: true,
  problems: ['already-exists', 'conflict', 'unusable-input', 'wrong-state'],
});

export const testPlanExpect = endpoint({
  kind: 'json',
  method: 'POST',
  path: '/api/v1/programmes/:programmeId/test-plans/:testPlanId/expectation',
  summary: 'Make a planned test the expected condition of results to come, or take that back',
  access: 'plans.edit',
  params: planParams,
  query: nothing,
  body: z.strictObject({ expected: z.boolean() }),
  response: testPlan,
  command: true,
  versioned: true,
  problems: ['conflict', 'wrong-state'],
});

export const testPlanRetire = endpoint({
  kind: 'json',
  method: 'POST',
  path: '/api/v1/programmes/:programmeId/test-plans/:testPlanId/retirement',
  summary: 'Retire a planned test, or bring it back; a retired one is expected no more',
  access: 'plans.edit',
  params: planParams,
  query: nothing,
  body: z.strictObject({ retired: z.boolean() }),
  response: testPlan,
  command: true,
  versioned: true,
  problems: ['conflict'],
});
