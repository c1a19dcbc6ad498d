import * as z from 'zod';
import { airState, condition } from './condition';
import { id, isoDate, name, nothing, positive, programmeParams, remark, timestamp, version } from './common';
import { endpoint } from './endpoint';

/** Which one area all coefficients are shown on: a typed area, or a variant's frontal area as it stands. */
export const commonArea = z.union([
  z.strictObject({ kind: z.literal('fixed'), areaM2: positive }),
  z.strictObject({ kind: z.literal('variant'), variantId: id }),
]);
export type CommonArea = z.infer<typeof commonArea>;

export const milestone = z.strictObject({ id, name, date: isoDate });
export type Milestone = z.infer<typeof milestone>;

export const programmeFields = z.strictObject({
  name,
  referenceSpeedKmh: z.number().positive().max(400),
  referenceAir: airState,
  referenceCondition: condition,
  characteristicLengthM: z.number().positive().max(30),
  characteristicLengthName: z.string().trim().min(1).max(60),
  /** Absent while no variant exists and no area is typed; the ranking then asks for it. */
  commonArea: commonArea.optional(),
  confidence: z.number().min(0.5).max(0.9999),
  windSpeedMs: z.number().min(0).max(30),
  referenceFacilityId: id.optional(),
  /** Whether results without a sweep are moved by the friction line; absent means on. */
  frictionLine: z.enum(['on', 'off']).optional(),
  milestones: z.array(z.strictObject({ id: id.optional(), name, date: isoDate })).max(40),
  remark: remark.optional(),
});
export type ProgrammeFields = z.infer<typeof programmeFields>;

export const programme = programmeFields.extend({
  id,
  version,
  milestones: z.array(milestone),
  retiredAt: timestamp.optional(),
});
export type Programme = z.infer<typeof programme>;

export const programmeSummary = z.strictObject({
  id,
  name,
  nextMilestone: milestone.optional(),
  variantCount: z.int(),
  resultCount: z.int(),
  latestResultDate: isoDate.optional(),
  /** Variants that have no usable result yet. */
  variantsWithoutResult: z.int(),
  retiredAt: timestamp.optional(),
});
export type ProgrammeSummary = z.infer<typeof programmeSummary>;

export const programmeList = endpoint({
  kind: 'json',
  method: 'GET',
  path: '/api/v1/programmes',
  summary: 'The programmes of the organisation',
  access: 'programmes.read',
  params: nothing,
  query: nothing,
  body: nothing,
  response: z.strictObject({ programmes: z.array(programmeSummary) }),
  command: false,
  versioned: false,
  problems: [],
});

export const programmeRead = endpoint({
  kind: 'json',
  method: 'GET',
  path: '/api/v1/programmes/:programmeId',
  summary: 'One programme with its reference condition and milestones',
  access: 'programmes.read',
  params: programmeParams,
  query: nothing,
  body: nothing,
  response: programme,
  command: false,
  versioned: false,
  problems: [],
});

/** Sent when a person opens a programme: sign-in leads to the latest one. */
export const programmeOpened = endpoint({
  kind: 'json',
  method: 'POST',
  path: '/api/v1/programmes/:programmeId/opening',
  summary: 'Remember that this person opened the programme, where the next sign-in leads',
  access: 'programmes.read',
  params: programmeParams,
  query: nothing,
  body: nothing,
  response: nothing,
  command: true,
  versioned: false,
  problems: [],
});

export const programmeCreate = endpoint({
  kind: 'json',
  method: 'POST',
  path: '/api/v1/programmes',
  summary: 'Open a programme',
  access: 'programmes.edit',
  params: nothing,
  query: nothing,
  body: programmeFields,
  response: programme,
  command: true,
  versioned: false,
  problems: ['already-exists', 'unusable-input'],
});

export const programmeUpdate = endpoint({
  kind: 'json',
  method: 'PUT',
  path: '/api/v1/programmes/:programmeId',
  summary: 'Change a programme',
  access: 'programmes.edit',
  params: programmeParams,
  query: nothing,
  body: programmeFields,
  response: programme,
  command: true,
  versioned: true,
  problems: ['already-exists', 'conflict', 'unusable-input'],
});

export const programmeRetire = endpoint({
  kind: 'json',
  method: 'POST',
  path: '/api/v1/programmes/:programmeId/retirement',
  summary: 'Retire a programme, or bring it back',
  access: 'programmes.edit',
  params: programmeParams,
  query: nothing,
  body: z.strictObject({ retired: z.boolean() }),
  response: programme,
  command: true,
  versioned: true,
  problems: ['conflict'],
});
