import * as z from 'zod';
import { airState, condition } from './condition';
import {
  degreesOfFreedom,
  id,
  isoDate,
  name,
  nothing,
  notNegative,
  positive,
  programmeParams,
  remark,
  timestamp,
} from './common';
import { endpoint } from './endpoint';
import { judgement, reason } from './judgements';

export const QUANTITIES = ['force', 'coefficient', 'drag-area', 'coastdown-f2'] as const;

/**
 * One reading of a result, the mean of `n` readings. The unit of `value` follows the result's quantity: N, 1, m² (at
 * full scale) or N/(km/h)². Lift and side force travel in the same unit (not for a coastdown).
 */
export const resultPoint = z.strictObject({
  yawDeg: z.number().min(-90).max(90),
  value: z.number(),
  s: notNegative.optional().describe('Standard deviation of a single reading'),
  n: z.int().min(1).optional(),
  speedKmh: positive.optional(),
  dynamicPressurePa: positive.optional(),
  tareN: z.number().optional(),
  frontLift: z.number().optional(),
  rearLift: z.number().optional(),
  sideForce: z.number().optional(),
});
export type ResultPoint = z.infer<typeof resultPoint>;

/** A result as it came: raw values, kept for ever. Nothing in it is ever corrected; a mistake is withdrawn and entered anew. */
export const resultFields = z.strictObject({
  variantId: id,
  facilityId: id,
  /** What people call it: a run number or a label. Unique in the programme. */
  name,
  testDate: isoDate,
  quantity: z.enum(QUANTITIES),
  scale: z.number().positive().max(1),
  quotedAreaM2: positive.optional(),
  quotedAreaUM2: notNegative.optional(),
  quotedAreaScale: z.enum(['model', 'full']).optional(),
  speedKmh: positive.optional(),
  dynamicPressurePa: positive.optional(),
  air: airState.optional(),
  tareAlreadySubtracted: z.boolean().optional(),
  tareN: z.number().optional(),
  condition,
  blockageAlreadyCorrectedBy: z.string().trim().min(1).max(120).optional(),
  turbulenceGenerationOrTrips: z.boolean().optional(),
  stated: z
    .strictObject({
      expandedU: notNegative,
      k: positive,
      degreesOfFreedom: degreesOfFreedom.optional(),
      includesFacilityBias: z.boolean().optional(),
    })
    .optional()
    .describe('The source’s own expanded uncertainty, in the unit of the value'),
  /** An entry in the facility; results of one name and facility share it. */
  session: z.string().trim().min(1).max(120).optional(),
  installation: z.string().trim().min(1).max(120).optional(),
  model: z.string().trim().min(1).max(120).optional(),
  source: z.string().trim().max(400).optional(),
  remark: remark.optional(),
  points: z.array(resultPoint).min(1).max(400),
  attachmentId: id.optional(),
});
export type ResultFields = z.infer<typeof resultFields>;

/**
 * Where a result stands. Superseded: a variant rested on it and rests on other results now. An adoption that was released
 * leaves its results checked.
 */
export const RESULT_STATES = ['entered', 'checked', 'adopted', 'superseded', 'withdrawn'] as const;
export type ResultState = (typeof RESULT_STATES)[number];

export const result = resultFields.extend({
  id,
  programmeId: id,
  /** Rises with every result entered in the organisation: decides among equal test dates. */
  entrySequence: z.int(),
  enteredAt: timestamp,
  enteredBy: name,
  importId: id.optional(),
  state: z.enum(RESULT_STATES),
  /** Its variant rests on it, alone or among others. */
  adopted: z.boolean(),
  judgement: judgement.optional().describe('What holds of it; absent: nobody judged it'),
  withdrawn: z.strictObject({ at: timestamp, by: name, reason: z.string() }).optional(),
});
export type Result = z.infer<typeof result>;

const resultParams = z.strictObject({ programmeId: id, resultId: id });

export const resultList = endpoint({
  kind: 'json',
  method: 'GET',
  path: '/api/v1/programmes/:programmeId/results',
  summary: 'All results of a programme with their raw values, withdrawn ones included',
  access: 'results.read',
  params: programmeParams,
  query: nothing,
  body: nothing,
  response: z.strictObject({ results: z.array(result) }),
  command: false,
  versioned: false,
  problems: [],
});

export const resultRead = endpoint({
  kind: 'json',
  method: 'GET',
  path: '/api/v1/programmes/:programmeId/results/:resultId',
  summary: 'One result with its raw values',
  access: 'results.read',
  params: resultParams,
  query: nothing,
  body: nothing,
  response: result,
  command: false,
  versioned: false,
  problems: [],
});

export const resultEnter = endpoint({
  kind: 'json',
  method: 'POST',
  path: '/api/v1/programmes/:programmeId/results',
  summary: 'Enter a result by hand',
  access: 'results.enter',
  params: programmeParams,
  query: nothing,
  body: resultFields,
  response: result,
  command: true,
  versioned: false,
  problems: ['already-exists', 'unusable-input', 'method-refused'],
});

export const resultWithdraw = endpoint({
  kind: 'json',
  method: 'POST',
  path: '/api/v1/programmes/:programmeId/results/:resultId/withdrawal',
  summary: 'Withdraw a result with a reason; it stays readable and counts for nothing',
  access: 'results.withdraw',
  params: resultParams,
  query: nothing,
  body: z.strictObject({ reason }),
  response: result,
  command: true,
  versioned: false,
  problems: ['wrong-state'],
});

const many = z.array(id).min(1).max(500);
const changed = z.strictObject({ results: z.array(result).describe('In the order asked for') });

export const resultsWithdraw = endpoint({
  kind: 'json',
  method: 'POST',
  path: '/api/v1/programmes/:programmeId/results/withdrawals',
  summary: 'Withdraw many results with one reason: all of them or none',
  access: 'results.withdraw',
  params: programmeParams,
  query: nothing,
  body: z.strictObject({ resultIds: many, reason }),
  response: changed,
  command: true,
  versioned: false,
  problems: ['wrong-state', 'unusable-input'],
});

export const resultsCheck = endpoint({
  kind: 'json',
  method: 'POST',
  path: '/api/v1/programmes/:programmeId/results/state-changes',
  summary: 'Say that results have been checked, or take that back, with one comment: all of them or none',
  access: 'results.check',
  params: programmeParams,
  query: nothing,
  body: z.strictObject({ resultIds: many, state: z.enum(['entered', 'checked']), comment: reason }),
  response: changed,
  command: true,
  versioned: false,
  problems: ['wrong-state', 'unusable-input'],
});

/** What happened to a result. Superseded: its variant rests on others since; released: on its newest again. */
export const RESULT_EVENTS = [
  'entered',
  'checked',
  'check-taken-back',
  'judged',
  'adopted',
  'superseded',
  'released',
  'withdrawn',
] as const;

export const resultEvent = z.strictObject({
  kind: z.enum(RESULT_EVENTS),
  at: timestamp,
  by: name,
  comment: z.string().optional(),
  judgement: judgement.optional(),
  adoptionId: id.optional(),
});
export type ResultEvent = z.infer<typeof resultEvent>;

export const resultHistory = endpoint({
  kind: 'json',
  method: 'GET',
  path: '/api/v1/programmes/:programmeId/results/:resultId/history',
  summary: 'What happened to a result: who, when and why',
  access: 'results.read',
  params: resultParams,
  query: nothing,
  body: nothing,
  response: z.strictObject({ events: z.array(resultEvent).describe('Newest first') }),
  command: false,
  versioned: false,
  problems: [],
});
