import * as z from 'zod';
import { id, isoDate, name, nothing, notNegative, positive, timestamp } from './common';
import { endpoint } from './endpoint';
import { reason } from './judgements';

export const CORRELATION_REPLACES = ['blockage', 'reynolds', 'ground-simulation'] as const;
export const correlationReplaces = z.enum(CORRELATION_REPLACES);
export type CorrelationReplaces = z.infer<typeof correlationReplaces>;

/**
 * One geometry measured in both facilities, as it stood when the version was made. Both figures are reduced before the
 * correlation, their u without the bias of the facility. Without result ids the figures were typed by hand.
 */
export const correlationPair = z.strictObject({
  geometry: name.describe('The variant or body that both were measured of'),
  resultId: id.optional(),
  referenceResultId: id.optional(),
  dragAreaM2: positive,
  uM2: notNegative.describe('Standard uncertainty, above 0'),
  referenceDragAreaM2: positive,
  referenceUM2: notNegative.describe('Standard uncertainty, above 0'),
  leftOutReason: reason.optional().describe('Kept and shown, but no part of the fit'),
});
export type CorrelationPair = z.infer<typeof correlationPair>;

export const correlationVersionFields = z.strictObject({
  replaces: z.array(correlationReplaces).max(3).describe('Steps before the correlation that it stands for'),
  pairs: z.array(correlationPair).min(1).max(200),
  comment: reason,
});
export type CorrelationVersionFields = z.infer<typeof correlationVersionFields>;

export const correlationVersion = correlationVersionFields.extend({
  id,
  number: z.int().min(1),
  pairs: z.array(correlationPair),
  at: timestamp,
  by: name,
});
export type CorrelationVersion = z.infer<typeof correlationVersion>;

/** From when on which version is used; without a version the use ends. */
export const correlationAdoption = z.strictObject({
  versionNumber: z.int().min(1).optional().describe('Absent: its use ends'),
  effectiveDate: isoDate,
  comment: reason,
  at: timestamp,
  by: name,
});
export type CorrelationAdoption = z.infer<typeof correlationAdoption>;

export const correlationSummary = z.strictObject({
  id,
  name,
  facilityId: id,
  referenceFacilityId: id,
  latestNumber: z.int().min(1),
  inUse: z
    .strictObject({ versionNumber: z.int().min(1), since: isoDate })
    .optional()
    .describe('Absent: no version of it is used today'),
});
export type CorrelationSummary = z.infer<typeof correlationSummary>;

export const correlation = correlationSummary.extend({
  versions: z.array(correlationVersion).describe('Newest first'),
  adoptions: z.array(correlationAdoption).describe('Last said first'),
});
export type Correlation = z.infer<typeof correlation>;

const correlationParams = z.strictObject({ correlationId: id });

export const correlationList = endpoint({
  kind: 'json',
  method: 'GET',
  path: '/api/v1/correlations',
  summary: 'How facilities and simulation set-ups are brought to one another',
  access: 'facilities.read',
  params: nothing,
  query: nothing,
  body: nothing,
  response: z.strictObject({ correlations: z.array(correlationSummary) }),
  command: false,
  versioned: false,
  problems: [],
});

export const correlationRead = endpoint({
  kind: 'json',
  method: 'GET',
  path: '/api/v1/correlations/:correlationId',
  summary: 'One correlation: every version with its pairs, and which was used from when on',
  access: 'results.read',
  params: correlationParams,
  query: nothing,
  body: nothing,
  response: correlation,
  command: false,
  versioned: false,
  problems: [],
});

export const correlationCreate = endpoint({
  kind: 'json',
  method: 'POST',
  path: '/api/v1/correlations',
  summary: 'Bring one facility to another by pairs of one geometry; this is its version 1, not yet in use',
  access: 'correlations.edit',
  params: nothing,
  query: nothing,
  body: correlationVersionFields.extend({ name, facilityId: id, referenceFacilityId: id }),
  response: correlation,
  command: true,
  versioned: false,
  problems: ['already-exists', 'unusable-input', 'method-refused'],
});

export const correlationVersionAdd = endpoint({
  kind: 'json',
  method: 'POST',
  path: '/api/v1/correlations/:correlationId/versions',
  summary: 'Save another version; those before it stay as they are',
  access: 'correlations.edit',
  params: correlationParams,
  query: nothing,
  body: correlationVersionFields.extend({
    basedOnNumber: z
      .int()
      .min(1)
      .describe('The newest version that the person saw; another one meanwhile is a conflict'),
  }),
  response: correlation,
  command: true,
  versioned: false,
  problems: ['conflict', 'unusable-input', 'method-refused'],
});

export const correlationAdopt = endpoint({
  kind: 'json',
  method: 'POST',
  path: '/api/v1/correlations/:correlationId/adoptions',
  summary: 'Use a version from a date on',
  access: 'correlations.adopt',
  params: correlationParams,
  query: nothing,
  body: z.strictObject({
    versionNumber: z.int().min(1),
    effectiveDate: isoDate,
    comment: reason,
  }),
  response: correlation,
  command: true,
  versioned: false,
  problems: ['wrong-state', 'unusable-input'],
});

export const correlationEnd = endpoint({
  kind: 'json',
  method: 'POST',
  path: '/api/v1/correlations/:correlationId/ending',
  summary: 'End the use of a correlation from a date on',
  access: 'correlations.adopt',
  params: correlationParams,
  query: nothing,
  body: z.strictObject({ effectiveDate: isoDate, comment: reason }),
  response: correlation,
  command: true,
  versioned: false,
  problems: ['wrong-state', 'unusable-input'],
});

/** A geometry measured in both facilities, with both figures as the programme reduces them. */
export const candidatePair = z.strictObject({
  programmeId: id,
  programmeName: name,
  variantId: id,
  geometry: name,
  resultId: id,
  resultName: name,
  testDate: isoDate,
  referenceResultId: id,
  referenceResultName: name,
  referenceTestDate: isoDate,
  dragAreaM2: positive,
  uM2: notNegative,
  referenceDragAreaM2: positive,
  referenceUM2: notNegative,
  newest: z.boolean().describe('Of this geometry the newest usable result of both facilities'),
  cautions: z.array(z.string()).describe('Codes of the reduction: of both results'),
  excludedBy: z.array(z.string()).describe('Rules by which one of the two would stay out of a ranking'),
});
export type CandidatePair = z.infer<typeof candidatePair>;

export const candidatePairList = endpoint({
  kind: 'json',
  method: 'GET',
  path: '/api/v1/correlation-pairs',
  summary:
    'Results of one geometry in two facilities, in every programme, as pairs that a correlation could rest on',
  access: 'ranking-inputs.read',
  params: nothing,
  query: z.strictObject({
    facilityId: id,
    referenceFacilityId: id,
    replaces: z
      .string()
      .regex(/^(blockage|reynolds|ground-simulation)?(,(blockage|reynolds|ground-simulation))*$/)
      .optional()
      .describe('Steps that the first facility’s figures are reduced without, separated by commas'),
  }),
  body: nothing,
  response: z.strictObject({
    pairs: z.array(candidatePair),
    refused: z
      .array(z.strictObject({ programmeName: name, resultName: name, detail: z.string() }))
      .describe('Results of the two facilities that could not be reduced'),
  }),
  command: false,
  versioned: false,
  problems: ['unusable-input'],
});
