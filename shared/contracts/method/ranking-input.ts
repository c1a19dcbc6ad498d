import * as z from 'zod';
import type { RankingInput } from '#shared/core/ranking/ranking-input';
import { airInputSchema } from './air';
import { correlationPairSchema } from './correlation';
import { cycleInputSchema } from './cycle';
import { degreesOfFreedomSchema, uncertaintySchema } from './figure';
import { sweepPointSchema } from './reynolds-sweep';
import { roadLoadReferenceSchema } from './road-load';

const text = z.string();
const number = z.number();
const dof = degreesOfFreedomSchema;
const u = uncertaintySchema.nullish();
const named = { id: text, name: text.nullish() };
const conditionValue = z.union([z.string(), z.number(), z.boolean()]);
const conditionSchema = z.record(z.string(), conditionValue.nullable());

const policiesSchema = z.strictObject({
  policyId: text.nullish(),
  machCaution: number.nullish(),
  machExcluded: number.nullish(),
  blockageCaution: number.nullish(),
  blockageExcluded: number.nullish(),
  openJetLimit: number.nullish(),
  minimumReynolds: number.nullish(),
  frictionLine: z.enum(['on', 'off']).nullish(),
  frictionShare: number.nullish(),
  frictionShareU: u,
  reynoldsToleranceM2: number.nullish(),
});

const programmeSchema = z.strictObject({
  name: text.nullish(),
  referenceSpeedKmh: number.positive(),
  referenceAir: airInputSchema,
  characteristicLengthM: number.positive(),
  commonAreaM2: number.positive(),
  confidence: number
    .gte(0.5, { error: 'confidence-out-of-range' })
    .lt(1, { error: 'confidence-out-of-range' })
    .nullish(),
  referenceFacilityId: text.nullish(),
  referenceCondition: conditionSchema.nullish(),
  windSpeedMs: number.nullish(),
  rotatingFactor: number.nullish(),
  policies: policiesSchema.nullish(),
});

/** The method's word and its numbers are checked where a result needs them, so that one bad facility refuses only its own. */
export const blockageMethodSchema = z.strictObject({
  method: text.describe('none, area-ratio, maskell (needs theta) or factor (needs factor)'),
  theta: number.nullish(),
  factor: number.nullish().describe('q_c/q, above 0'),
  uFractionOfCorrection: u,
  uRelative: u,
});

const facilitySchema = z.strictObject({
  ...named,
  kind: z.enum(['closed', 'open-jet', 'slotted', 'road', 'simulation']),
  areaM2: number.nullish().describe('Above 0; needed for closed, open-jet and slotted'),
  blockage: blockageMethodSchema.nullish(),
  biasURelative: u,
  biasUM2: u,
  sessionURelative: u,
  sessionUM2: u,
  sessionDegreesOfFreedom: dof,
  installationURelative: u,
  installationUM2: u,
  installationDegreesOfFreedom: dof,
  repeatabilityURelative: u,
  repeatabilityDegreesOfFreedom: dof,
});

const variantSchema = z.strictObject({
  ...named,
  frontalAreaM2: number.positive(),
  frontalAreaUM2: u,
  massKg: number.positive().nullish(),
  rollingResistance: number.nullish(),
  roadLoadReference: roadLoadReferenceSchema.nullish(),
  evidence: z.enum(['newest', 'weighted-mean']).nullish(),
});

const pointSchema = z.strictObject({
  yawDeg: number.nullish(),
  value: number.nullish().describe('Needed'),
  s: u,
  n: number.nullish().describe('At least 1'),
  speedKmh: number.nullish(),
  dynamicPressurePa: number.nullish(),
  tareN: number.nullish(),
  frontLift: number.nullish(),
  rearLift: number.nullish(),
  sideForce: number.nullish(),
});

/** Beyond the three ids nothing is demanded here: what is missing or out of range refuses the result by itself. */
const resultSchema = z.strictObject({
  ...named,
  variantId: text,
  facilityId: text,
  sessionId: text.nullish(),
  installationId: text.nullish(),
  modelId: text.nullish(),
  testDate: text
    .regex(/^\d{4}-\d{2}-\d{2}$/)
    .nullish()
    .describe('YYYY-MM-DD; needed'),
  entrySequence: number.nullish(),
  quantity: text.nullish().describe('force, coefficient, drag-area or coastdown-f2; needed'),
  scale: number.nullish().describe('Model length over full length, above 0, at most 1; needed'),
  quotedAreaM2: number.nullish(),
  quotedAreaUM2: u,
  quotedAreaScale: z.enum(['model', 'full']).nullish(),
  speedKmh: number.nullish(),
  dynamicPressurePa: number.nullish(),
  air: airInputSchema.nullish(),
  tareAlreadySubtracted: z.boolean().nullish(),
  tareN: number.nullish(),
  condition: conditionSchema.nullish(),
  blockageAlreadyCorrectedBy: text.nullish(),
  turbulenceGenerationOrTrips: z.boolean().nullish(),
  reynoldsMethod: text
    .regex(/^(friction-line|own-sweep|sweep:.*)$/s)
    .nullish()
    .describe('friction-line (as when absent), own-sweep or sweep:<id>'),
  includedWithReason: text.nullish(),
  stated: z
    .strictObject({
      expandedU: u,
      k: number.nullish(),
      degreesOfFreedom: dof,
      includesFacilityBias: z.boolean().nullish(),
    })
    .nullish(),
  points: z.array(pointSchema).nullish().describe('At least one; needed'),
});

const sweepSchema = z.strictObject({
  ...named,
  points: z.array(sweepPointSchema),
});

const adjustmentSchema = z.strictObject({
  ...named,
  item: text,
  fromValue: conditionValue.nullish(),
  toValue: conditionValue.nullish(),
  deltaDragAreaM2: number.nullish(),
  uM2: u,
  perUnitDragAreaM2: number.nullish(),
  uPerUnitM2: u,
  degreesOfFreedom: dof,
  variantIds: z.array(text).nullish().describe('The variants that it holds for; absent: every variant'),
});

const correlationSchema = z.strictObject({
  ...named,
  facilityId: text,
  referenceFacilityId: text,
  replaces: z.array(z.enum(['blockage', 'reynolds', 'ground-simulation'])).nullish(),
  pairs: z.array(correlationPairSchema),
});

/** Input of the operations `rank` and `reduce`; the response of `ranking-inputs` is of the same shape. */
export const rankingInputSchema = z.strictObject({
  programme: programmeSchema,
  facilities: z.array(facilitySchema),
  models: z.array(z.strictObject({ ...named, scaleU: u })).nullish(),
  variants: z.array(variantSchema),
  results: z.array(resultSchema),
  sweeps: z.array(sweepSchema).nullish(),
  adjustments: z.array(adjustmentSchema).nullish(),
  correlations: z.array(correlationSchema).nullish(),
  request: z
    .strictObject({
      basis: z.enum(['zero-yaw', 'wind-averaged']).nullish(),
      cycle: cycleInputSchema.nullish(),
      seed: number.nullish(),
    })
    .nullish(),
}) satisfies z.ZodType<RankingInput>;
