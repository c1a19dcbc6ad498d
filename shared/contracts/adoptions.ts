import * as z from 'zod';
import type { EvaluationOutput, EvaluationParameters } from '#shared/core/ranking/evaluation-output';
import { id, name, nothing, programmeParams, timestamp, variantParams } from './common';
import { endpoint } from './endpoint';
import { EVIDENCE_RULES, reason } from './judgements';
import { figureSchema } from './method/figure';

/** What a variant rests on. Without results it rests on its newest usable one: the adoption before was released. */
export const adoption = z.strictObject({
  id,
  variantId: id,
  resultIds: z.array(id).describe('In the order of entry; empty: the adoption before was released'),
  rule: z.enum(EVIDENCE_RULES),
  comment: z.string(),
  at: timestamp,
  by: name,
});
export type Adoption = z.infer<typeof adoption>;

export const adoptionOrder = z.strictObject({
  variantId: id,
  /** Empty: releases the adoption that stands. */
  resultIds: z.array(id).max(50),
  rule: z.enum(EVIDENCE_RULES),
  /** The adoption that the person saw standing, absent where none did; another one meanwhile is a conflict. */
  expectedAdoptionId: id.optional(),
});
export type AdoptionOrder = z.infer<typeof adoptionOrder>;

export const adoptionList = endpoint({
  kind: 'json',
  method: 'GET',
  path: '/api/v1/programmes/:programmeId/adoptions',
  summary: 'Which results each variant rests on, with the history of that choice',
  access: 'results.read',
  params: programmeParams,
  query: nothing,
  body: nothing,
  response: z.strictObject({ adoptions: z.array(adoption).describe('Newest first') }),
  command: false,
  versioned: false,
  problems: [],
});

export const evidenceAdopt = endpoint({
  kind: 'json',
  method: 'POST',
  path: '/api/v1/programmes/:programmeId/adoptions',
  summary:
    'Let variants rest on results, or release that, with one comment: all of it or nothing. What is only entered counts as checked by it. Each adoption stores its evaluation',
  access: 'results.adopt',
  params: programmeParams,
  query: nothing,
  body: z.strictObject({ adoptions: z.array(adoptionOrder).min(1).max(300), comment: reason }),
  response: z.strictObject({ adoptions: z.array(adoption).describe('In the order asked for') }),
  command: true,
  versioned: false,
  problems: ['conflict', 'wrong-state', 'unusable-input', 'method-refused'],
});

const evaluatedResult = z.strictObject({
  resultId: z.string(),
  reynolds: z.number().nullable(),
  mach: z.number().nullable(),
  blockageRatio: z.number().nullable(),
  steps: z.array(
    z.strictObject({
      step: z.enum(['full-scale-drag-area', 'reynolds', 'condition-adjustments', 'facility-correlation']),
      dragAreaM2: z.number().nullable(),
    }),
  ),
  zeroYaw: figureSchema,
  windAveragedDragAreaM2: z.number().nullable(),
  windAveragedStandardUncertaintyM2: z.number().nullable(),
  cautions: z.array(z.string()),
});

/** What an evaluation came to. A figure is null where no adopted result was usable on that basis. */
export const evaluationOutput: z.ZodType<EvaluationOutput, EvaluationOutput> = z.strictObject({
  zeroYaw: figureSchema.nullable(),
  windAveraged: figureSchema.nullable(),
  usedResultIds: z.array(z.string()),
  combination: z
    .strictObject({
      weights: z.array(z.number()),
      chiSquared: z.number(),
      birgeRatio: z.number().nullable(),
      betweenResultsVarianceM4: z.number(),
      randomEffectsMeanM2: z.number(),
    })
    .nullable(),
  results: z.array(evaluatedResult),
  excluded: z.array(z.strictObject({ resultId: z.string(), rules: z.array(z.string()) })),
});

export const evaluationParameters: z.ZodType<EvaluationParameters, EvaluationParameters> = z.strictObject({
  policyId: z.string().nullable(),
  frictionLine: z.string().nullable(),
  facilityVersions: z.array(z.strictObject({ facilityId: z.string(), number: z.int() })),
  correlationIds: z.array(z.string()),
  adjustmentIds: z.array(z.string()),
});

const difference = z.strictObject({
  field: z.string().describe('Dotted path in the output'),
  stored: z.union([z.number(), z.string(), z.null()]),
  now: z.union([z.number(), z.string(), z.null()]),
  /** Now minus stored; null where one of them is no number. */
  difference: z.number().nullable(),
});

/** What an adopted figure was computed from and came to, and whether it comes to the same now. */
export const evaluation = z.strictObject({
  id,
  adoptionId: id,
  variantId: id,
  at: timestamp,
  by: name,
  inputs: z.string().describe('Canonical JSON: the input of the operation `rank`, of this variant alone'),
  inputsHash: z.string().describe('SHA-256 of `inputs`, hexadecimal'),
  methods: z.array(z.string()).describe('`id@version` in the order of use'),
  parameters: evaluationParameters,
  output: evaluationOutput,
  recomputed: z.strictObject({
    differences: z.array(difference).describe('Empty: the same figure, to 1e-12'),
    refusal: z.string().optional().describe('The code, where the method refuses these inputs now'),
  }),
});
export type Evaluation = z.infer<typeof evaluation>;

export const evaluationList = endpoint({
  kind: 'json',
  method: 'GET',
  path: '/api/v1/programmes/:programmeId/variants/:variantId/evaluations',
  summary: 'The stored evaluations of a variant, each computed again',
  access: 'results.read',
  params: variantParams,
  query: nothing,
  body: nothing,
  response: z.strictObject({ evaluations: z.array(evaluation).describe('Newest first') }),
  command: false,
  versioned: false,
  problems: [],
});
