import * as z from 'zod';
import { condition } from './condition';
import {
  degreesOfFreedom,
  id,
  name,
  nothing,
  notNegative,
  positive,
  remark,
  timestamp,
  version,
} from './common';
import { endpoint } from './endpoint';

export const FACILITY_KINDS = ['closed', 'open-jet', 'slotted', 'road', 'simulation'] as const;
export const BLOCKAGE_METHODS = ['none', 'area-ratio', 'maskell', 'factor'] as const;

export const blockageMethod = z.strictObject({
  method: z.enum(BLOCKAGE_METHODS),
  theta: positive.optional().describe('Maskell only; typed for the facility, no default'),
  factor: positive.optional().describe('factor only: q_c/q from the facility’s own calibration'),
  uFractionOfCorrection: notNegative.optional(),
  uRelative: notNegative.optional().describe('none only: times the drag area'),
});

export const facilityFields = z.strictObject({
  name,
  kind: z.enum(FACILITY_KINDS),
  areaM2: positive.optional().describe('Test section (closed, slotted) or nozzle (open jet)'),
  blockage: blockageMethod.optional(),
  /** What the facility can and usually does: taken over by results entered there, and editable there. */
  usualCondition: condition,
  biasURelative: notNegative.optional(),
  biasUM2: notNegative.optional(),
  sessionURelative: notNegative.optional(),
  sessionUM2: notNegative.optional(),
  sessionDegreesOfFreedom: degreesOfFreedom.optional(),
  installationURelative: notNegative.optional(),
  installationUM2: notNegative.optional(),
  installationDegreesOfFreedom: degreesOfFreedom.optional(),
  repeatabilityURelative: notNegative.optional(),
  repeatabilityDegreesOfFreedom: degreesOfFreedom.optional(),
  /** The body that is measured in every session. */
  checkBody: z.strictObject({ name, remark: remark.optional() }).optional(),
  remark: remark.optional(),
});
export type FacilityFields = z.infer<typeof facilityFields>;

export const facility = facilityFields.extend({
  id,
  version,
  versionNumber: z.int().min(1).describe('Which version of corrections and uncertainties stands, from 1 on'),
  retiredAt: timestamp.optional(),
});
export type Facility = z.infer<typeof facility>;

export const facilityChange = facilityFields.extend({
  comment: z
    .string()
    .trim()
    .min(3)
    .max(1000)
    .optional()
    .describe('Why corrections or uncertainties change; needed where they do, and kept with the version'),
});
export type FacilityChange = z.infer<typeof facilityChange>;

export const facilityVersion = z.strictObject({
  number: z.int().min(1),
  fields: facilityFields,
  comment: z.string().optional(),
  at: timestamp,
  by: name.optional().describe('Absent where nobody is on record'),
});
export type FacilityVersion = z.infer<typeof facilityVersion>;

/** How many results of a programme come from a facility. */
export const facilityEvidence = z.strictObject({
  programmeId: id,
  programmeName: name,
  results: z.int().min(1).describe('Withdrawn ones included'),
});
export type FacilityEvidence = z.infer<typeof facilityEvidence>;

/** A result by how much of the section its model took. */
export const testedModel = z.strictObject({
  programmeId: id,
  resultId: id,
  resultName: name,
  variantName: name,
  modelAreaM2: positive.describe('Frontal area at the scale of the test'),
});
export type TestedModel = z.infer<typeof testedModel>;

const facilityParams = z.strictObject({ facilityId: id });

export const facilityList = endpoint({
  kind: 'json',
  method: 'GET',
  path: '/api/v1/facilities',
  summary: 'Tunnels, simulation set-ups and proving grounds of the organisation',
  access: 'facilities.read',
  params: nothing,
  query: nothing,
  body: nothing,
  response: z.strictObject({ facilities: z.array(facility) }),
  command: false,
  versioned: false,
  problems: [],
});

export const facilityRead = endpoint({
  kind: 'json',
  method: 'GET',
  path: '/api/v1/facilities/:facilityId',
  summary: 'One facility with its corrections and uncertainties',
  access: 'facilities.read',
  params: facilityParams,
  query: nothing,
  body: nothing,
  response: facility,
  command: false,
  versioned: false,
  problems: [],
});

export const facilityCreate = endpoint({
  kind: 'json',
  method: 'POST',
  path: '/api/v1/facilities',
  summary: 'Add a facility',
  access: 'facilities.edit',
  params: nothing,
  query: nothing,
  body: facilityFields,
  response: facility,
  command: true,
  versioned: false,
  problems: ['already-exists', 'unusable-input'],
});

export const facilityUpdate = endpoint({
  kind: 'json',
  method: 'PUT',
  path: '/api/v1/facilities/:facilityId',
  summary: 'Change a facility; changed corrections or uncertainties become a new version, with a comment',
  access: 'facilities.edit',
  params: facilityParams,
  query: nothing,
  body: facilityChange,
  response: facility,
  command: true,
  versioned: true,
  problems: ['already-exists', 'conflict', 'unusable-input'],
});

export const facilityRetire = endpoint({
  kind: 'json',
  method: 'POST',
  path: '/api/v1/facilities/:facilityId/retirement',
  summary: 'Retire a facility, or bring it back',
  access: 'facilities.edit',
  params: facilityParams,
  query: nothing,
  body: z.strictObject({ retired: z.boolean() }),
  response: facility,
  command: true,
  versioned: true,
  problems: ['conflict'],
});

export const facilityVersionList = endpoint({
  kind: 'json',
  method: 'GET',
  path: '/api/v1/facilities/:facilityId/versions',
  summary: 'What the corrections and uncertainties of a facility were, change by change',
  access: 'facilities.read',
  params: facilityParams,
  query: nothing,
  body: nothing,
  response: z.strictObject({ versions: z.array(facilityVersion).describe('Newest first') }),
  command: false,
  versioned: false,
  problems: [],
});

export const facilityEvidenceList = endpoint({
  kind: 'json',
  method: 'GET',
  path: '/api/v1/facilities/:facilityId/evidence',
  summary: 'How many results each programme has from a facility',
  access: 'facilities.read',
  params: facilityParams,
  query: nothing,
  body: nothing,
  response: z.strictObject({ programmes: z.array(facilityEvidence) }),
  command: false,
  versioned: false,
  problems: [],
});

export const facilityModelList = endpoint({
  kind: 'json',
  method: 'GET',
  path: '/api/v1/facilities/:facilityId/models',
  summary: 'The results whose models were the largest that stood in a facility',
  access: 'results.read',
  params: facilityParams,
  query: nothing,
  body: nothing,
  response: z.strictObject({ models: z.array(testedModel).describe('Largest first, at most 50') }),
  command: false,
  versioned: false,
  problems: [],
});
