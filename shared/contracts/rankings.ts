import * as z from 'zod';
import { BASES, EVIDENCE_BASES, ORDERS } from '#shared/core/ranking/ranking-choices';
import type { RankingContext } from '#shared/core/ranking/ranking-context';
import type { RankingInput } from '#shared/core/ranking/ranking-input';
import type { RankingView } from '#shared/core/ranking/ranking-view';
import { nothing, programmeParams } from './common';
import { endpoint } from './endpoint';
import { EVIDENCE_RULES } from './judgements';
import { airInputSchema } from './method/air';
import { rankingInputSchema } from './method/ranking-input';
import { figureSchema } from './method/figure';
import { roadLoadReferenceSchema } from './method/road-load';

const number = z.number();
const text = z.string();
const named = { variantId: text, name: text };

const areaChoice = z
  .string()
  .regex(/^(programme|variant:[0-9a-zA-Z-]{1,60}|\d{1,2}(\.\d{1,9})?)$/)
  .optional()
  .describe('`programme`, `variant:<id>` or m²');

/** The choices of the ranking as they stand in an address; one left out has its default. */
export const rankingQuery = z.strictObject({
  order: z.enum(ORDERS).optional(),
  area: areaChoice,
  cycle: z.string().min(1).max(60).optional().describe('Key of a cycle; `wltc-class-3b`'),
  air: z
    .string()
    .max(60)
    .optional()
    .describe('`programme`, a named state, or `custom:<°C>:<Pa>:<relative humidity>`'),
  evidence: z.enum(EVIDENCE_BASES).optional(),
  basis: z.enum(BASES).optional(),
  configuration: z.string().min(1).max(120).optional().describe('`base` or the name of a configuration'),
  confidence: z
    .string()
    .regex(/^0\.[5-9]\d{0,5}$/)
    .optional(),
});
export type RankingQuery = z.infer<typeof rankingQuery>;

const contextReason = z.strictObject({ resultId: text, reason: text, at: text, by: text });

const contextVariant = z.strictObject({
  id: text,
  name: text,
  bodyShape: text,
  description: text.optional(),
  lengthMm: number.optional(),
  widthMm: number.optional(),
  heightMm: number.optional(),
  wheelbaseMm: number.optional(),
  frontalAreaMethod: text,
  frontalAreaDate: text,
  configurations: z.array(
    z.strictObject({
      id: text,
      name: text,
      massKg: number,
      rollingResistance: number.optional(),
      roadLoadReference: roadLoadReferenceSchema.optional(),
      salesShare: number,
    }),
  ),
});

/** Typed by the core, so that lists are read-only on both sides. */
export const rankingContext: z.ZodType<RankingContext, RankingContext> = z.strictObject({
  programme: z.strictObject({
    id: text,
    name: text,
    commonArea: z.union([
      z.strictObject({ kind: z.literal('fixed'), areaM2: number }),
      z.strictObject({ kind: z.literal('variant'), variantId: text }),
    ]),
    characteristicLengthName: text,
    milestones: z.array(z.strictObject({ id: text, name: text, date: text })),
  }),
  variants: z.array(contextVariant),
  adoptions: z.array(
    z.strictObject({
      id: text,
      variantId: text,
      resultIds: z.array(text),
      rule: z.enum(EVIDENCE_RULES),
      at: text,
      by: text,
    }),
  ),
  setAside: z.array(contextReason),
  included: z.array(contextReason),
  policyNumber: z.int().nullable(),
  sessions: z.array(z.strictObject({ id: text, name: text })),
  facilityVersions: z.array(z.strictObject({ facilityId: text, number: z.int() })),
  correlations: z.array(z.strictObject({ id: text, name: text, number: z.int(), since: text, by: text })),
  cycles: z.array(
    z.strictObject({
      key: text,
      name: text,
      source: text,
      timeS: z.array(number),
      speedKmh: z.array(number),
    }),
  ),
});

export const viewFigure = figureSchema.omit({ contributions: true });
const viewCoefficient = z.strictObject({ areaM2: number, value: number, expandedUncertainty: number });
export const viewEvidence = z.strictObject({
  resultId: text,
  name: text,
  testDate: text,
  facilityName: text,
  facilityKind: z.enum(['closed', 'open-jet', 'slotted', 'road', 'simulation']),
  scale: number,
  adopted: z.boolean(),
  includedReason: text.nullable(),
});
const conditionValue = z.union([text, number, z.boolean()]);

const viewRow = z.strictObject({
  rank: z.int(),
  ...named,
  bodyShape: text,
  description: text,
  lengthMm: number.nullable(),
  heightMm: number.nullable(),
  wheelbaseMm: number.nullable(),
  figure: viewFigure,
  onCommonArea: viewCoefficient,
  onOwnArea: viewCoefficient,
  configuration: text.nullable(),
  baseStandsIn: z.boolean(),
  massKg: number.nullable(),
  energy: z
    .strictObject({
      wheelEnergyWhPerKm: number,
      expandedUncertaintyWhPerKm: number,
      brakingEnergyWhPerKm: number,
      whPerKmPerCount: number,
      f0N: number,
      f1NPerKmh: number,
      f2NPerKmh2: number,
    })
    .nullable(),
  rankByDragArea: z.int(),
  rankByOwnArea: z.int(),
  rankByEnergy: z.int().nullable(),
  probabilityLowerThanNext: number.nullable(),
  evidence: z.array(viewEvidence),
  rule: z.enum(EVIDENCE_RULES),
  combination: z
    .strictObject({
      weights: z.array(number),
      chiSquared: number,
      birgeRatio: number.nullable(),
      betweenResultsVarianceM4: number,
      randomEffectsMeanM2: number,
    })
    .nullable(),
  newer: viewEvidence.nullable(),
  reynolds: number.nullable(),
  mach: number.nullable(),
  blockageRatio: number.nullable(),
  cautions: z.array(
    z.enum([
      'blockage',
      'included-with-reason',
      'mach',
      'outside-cipm-2007-range',
      'transition',
      'unpaired-yaw-in-unsymmetrical-sweep',
    ]),
  ),
  steps: z.array(
    z.strictObject({
      step: z.enum([
        'full-scale-drag-area',
        'reynolds',
        'condition-adjustments',
        'facility-correlation',
        'yaw-ratio',
      ]),
      dragAreaM2: number,
    }),
  ),
  contributions: z.array(
    z.strictObject({
      key: text,
      amountM2: number,
      degreesOfFreedom: number.nullable(),
      shareOfVariance: number,
      varianceEstimate: text.optional(),
      kind: text,
      of: text,
    }),
  ),
});

const viewNotice = z.strictObject({
  order: z.enum(['own-area', 'energy']),
  inversions: z.array(
    z.strictObject({
      ...named,
      direction: z.enum(['behind', 'ahead']),
      value: number,
      others: z.array(z.strictObject({ ...named, value: number })),
      extreme: z.enum(['smallest', 'largest']).nullable(),
    }),
  ),
  more: z.int(),
});

export const viewExclusion = z.strictObject({
  resultId: text,
  name: text,
  variantId: text,
  variantName: text,
  facilityName: text,
  testDate: text,
  adopted: z.boolean(),
  rules: z.array(
    z.strictObject({
      rule: text,
      remedy: z.enum(['include-with-reason', 'change-policy', 'enter-anew', 'measure-yaw', 'bring-back']),
      value: number.nullable(),
      limit: number.nullable(),
      items: z.array(
        z.strictObject({ item: text, reference: conditionValue, stated: conditionValue.nullable() }),
      ),
      detail: text.nullable(),
    }),
  ),
});

export const viewGroup = z.strictObject({
  variantIds: z.array(text),
  names: z.array(text),
  fromRank: z.int(),
  toRank: z.int(),
  difference: number,
  probability: number,
});

export const rankingView: z.ZodType<RankingView, RankingView> = z.strictObject({
  programmeName: text,
  order: z.enum(ORDERS),
  basis: z.enum(BASES),
  evidence: z.enum(EVIDENCE_BASES),
  commonAreaM2: number,
  commonAreaOf: text.nullable(),
  confidence: number,
  cycle: z.strictObject({ key: text, name: text, distanceM: number }).nullable(),
  air: z.strictObject({ state: text, densityKgM3: number }),
  configuration: text.nullable(),
  referenceReynolds: number,
  characteristicLengthName: text,
  ignored: z.array(z.enum(['area', 'air', 'cycle', 'configuration', 'order'])),
  resultCount: z.int(),
  rows: z.array(viewRow),
  groups: z.array(viewGroup),
  notices: z.array(viewNotice),
  stayedOut: z.array(viewExclusion),
  withoutEvidence: z.array(z.strictObject(named)),
  withoutEnergy: z.array(z.strictObject(named)),
  offers: z.strictObject({
    areas: z.array(z.strictObject({ ...named, areaM2: number })),
    cycles: z.array(z.strictObject({ key: text, name: text })),
    configurations: z.array(text),
    programmeAir: airInputSchema,
    programmeAreaM2: number,
    programmeAreaOf: text.nullable(),
    programmeConfidence: number,
  }),
});

const rankingInputs: z.ZodType<RankingInput, RankingInput> = rankingInputSchema;

export const rankingInputsRead = endpoint({
  kind: 'json',
  method: 'GET',
  path: '/api/v1/programmes/:programmeId/ranking-inputs',
  summary:
    'Everything that the ranking depends on, in the shape that the machine entry’s operation `rank` takes, with names',
  access: 'ranking-inputs.read',
  params: programmeParams,
  query: z.strictObject({
    area: areaChoice.describe('Stands in where the programme has no common area; `variant:<id>` or m²'),
    evidence: z
      .enum([...EVIDENCE_BASES, 'all'])
      .optional()
      .describe(
        '`adopted`: a variant with an adoption carries its adopted results alone, with its rule; `newest`: all results that are not set aside; `all`: those too, for trying a change of judgement',
      ),
  }),
  body: nothing,
  response: rankingInputs,
  command: false,
  versioned: false,
  problems: ['unusable-input'],
});

export const rankingContextRead = endpoint({
  kind: 'json',
  method: 'GET',
  path: '/api/v1/programmes/:programmeId/ranking-context',
  summary:
    'What the ranking screen needs beside the inputs: adoptions, configurations, cycles with their traces',
  access: 'ranking-inputs.read',
  params: programmeParams,
  query: z.strictObject({
    area: areaChoice.describe('Stands in where the programme has no common area; `variant:<id>` or m²'),
  }),
  body: nothing,
  response: rankingContext,
  command: false,
  versioned: false,
  problems: ['unusable-input'],
});

export const rankingViewRead = endpoint({
  kind: 'json',
  method: 'GET',
  path: '/api/v1/programmes/:programmeId/ranking-view',
  summary: 'The ranking for the choices in the query, without the raw evidence',
  access: 'ranking-view.read',
  params: programmeParams,
  query: rankingQuery,
  body: nothing,
  response: rankingView,
  command: false,
  versioned: false,
  problems: ['unusable-input', 'method-refused'],
});
