import * as z from 'zod';
import { id, isoDate, name, nothing, positive, notNegative, remark, timestamp, version } from './common';
import { endpoint } from './endpoint';

/** An entry in a facility: its results share the error of that entry. */
export const testSessionFields = z.strictObject({
  name,
  startDate: isoDate.optional(),
  endDate: isoDate.optional(),
  remark: remark.optional(),
});
export type TestSessionFields = z.infer<typeof testSessionFields>;

export const testSession = testSessionFields.extend({
  id,
  facilityId: id,
  version,
  results: z.int().min(0).describe('Entered for this session, withdrawn ones included'),
  installations: z.array(z.string()).describe('Named by its results, each once'),
  checkMeasurements: z.int().min(0).describe('Of the check body, without those struck out'),
});
export type TestSession = z.infer<typeof testSession>;

/** A measurement of the facility's check body; the mean of `n` readings. */
export const checkMeasurementFields = z.strictObject({
  testSessionId: id,
  measuredOn: isoDate,
  dragAreaM2: positive.max(50),
  s: notNegative.optional().describe('Standard deviation of a single reading [m²]; needs n of at least 2'),
  n: z.int().min(1).max(100_000).optional(),
  remark: remark.optional(),
});
export type CheckMeasurementFields = z.infer<typeof checkMeasurementFields>;

export const checkMeasurement = checkMeasurementFields.extend({
  id,
  checkBody: name.describe('The body as the facility named it when this was entered'),
  enteredAt: timestamp,
  enteredBy: name,
  struck: z
    .strictObject({ at: timestamp, by: name, reason: z.string() })
    .optional()
    .describe('Struck out: it stays readable and counts for nothing'),
});
export type CheckMeasurement = z.infer<typeof checkMeasurement>;

const facilityParams = z.strictObject({ facilityId: id });
const sessionParams = z.strictObject({ facilityId: id, testSessionId: id });
const sessionsPath = '/api/v1/facilities/:facilityId/sessions';
const measurementsPath = '/api/v1/facilities/:facilityId/check-measurements';

export const testSessionList = endpoint({
  kind: 'json',
  method: 'GET',
  path: sessionsPath,
  summary: 'The sessions of a facility, newest first',
  access: 'facilities.read',
  params: facilityParams,
  query: nothing,
  body: nothing,
  response: z.strictObject({ sessions: z.array(testSession) }),
  command: false,
  versioned: false,
  problems: [],
});

export const testSessionRead = endpoint({
  kind: 'json',
  method: 'GET',
  path: `${sessionsPath}/:testSessionId`,
  summary: 'One session of a facility',
  access: 'facilities.read',
  params: sessionParams,
  query: nothing,
  body: nothing,
  response: testSession,
  command: false,
  versioned: false,
  problems: [],
});

export const testSessionCreate = endpoint({
  kind: 'json',
  method: 'POST',
  path: sessionsPath,
  summary: 'Add a session to a facility; results entered under its name join it',
  access: 'facilities.edit',
  params: facilityParams,
  query: nothing,
  body: testSessionFields,
  response: testSession,
  command: true,
  versioned: false,
  problems: ['already-exists', 'unusable-input'],
});

export const testSessionUpdate = endpoint({
  kind: 'json',
  method: 'PUT',
  path: `${sessionsPath}/:testSessionId`,
  summary: 'Change the name, dates or remark of a session',
  access: 'facilities.edit',
  params: sessionParams,
  query: nothing,
  body: testSessionFields,
  response: testSession,
  command: true,
  versioned: true,
  problems: ['already-exists', 'conflict', 'unusable-input'],
});

export const checkMeasurementList = endpoint({
  kind: 'json',
  method: 'GET',
  path: measurementsPath,
  summary: 'The measurements of a facility’s check body, by date, those struck out included',
  access: 'facilities.read',
  params: facilityParams,
  query: nothing,
  body: nothing,
  response: z.strictObject({ measurements: z.array(checkMeasurement) }),
  command: false,
  versioned: false,
  problems: [],
});

export const checkMeasurementEnter = endpoint({
  kind: 'json',
  method: 'POST',
  path: measurementsPath,
  summary: 'Enter a measurement of the facility’s check body',
  access: 'facilities.edit',
  params: facilityParams,
  query: nothing,
  body: checkMeasurementFields,
  response: checkMeasurement,
  command: true,
  versioned: false,
  problems: ['unusable-input', 'wrong-state'],
});

export const checkMeasurementStrike = endpoint({
  kind: 'json',
  method: 'POST',
  path: `${measurementsPath}/:checkMeasurementId/striking`,
  summary:
    'Strike out a measurement of the check body with a reason; it stays readable and counts for nothing',
  access: 'facilities.edit',
  params: z.strictObject({ facilityId: id, checkMeasurementId: id }),
  query: nothing,
  body: z.strictObject({ reason: z.string().trim().min(3).max(1000) }),
  response: checkMeasurement,
  command: true,
  versioned: false,
  problems: ['wrong-state'],
});
