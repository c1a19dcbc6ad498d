import * as z from 'zod';
import type { RankOutput, ReduceOutput } from '#shared/core/ranking/ranking-output';
import { figureSchema } from './figure';

const number = z.number();
const ids = z.array(z.string());

export const reducedResultSchema = z.strictObject({
  resultId: z.string(),
  variantId: z.string(),
  reynolds: number.nullable(),
  mach: number.nullable(),
  blockageRatio: number.nullable(),
  dynamicPressurePa: number.nullable(),
  modelDragAreaM2: number,
  blockageCorrectedModelDragAreaM2: number,
  steps: z.array(
    z.strictObject({
      step: z.enum(['full-scale-drag-area', 'reynolds', 'condition-adjustments', 'facility-correlation']),
      dragAreaM2: number.nullable(),
    }),
  ),
  yawRatio: number.nullable(),
  zeroYaw: figureSchema,
  windAveragedDragAreaM2: number.nullable(),
  windAveragedStandardUncertaintyM2: number.nullable(),
  windAveragedRefusal: z.string().nullable(),
  liftAndSide: z.array(
    z.strictObject({
      yawDeg: number,
      frontLiftAreaM2: number.nullable(),
      rearLiftAreaM2: number.nullable(),
      sideForceAreaM2: number.nullable(),
    }),
  ),
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
  excludedBy: z.array(z.enum(['mach', 'blockage', 'not-comparable'])),
});

const reduceFields = {
  reducedResults: z.array(reducedResultSchema),
  excludedResults: z.array(z.strictObject({ resultId: z.string(), variantId: z.string(), rules: ids })),
};

export const rankedVariantSchema = figureSchema.extend({
  variantId: z.string(),
  evidence: z.enum(['newest', 'weighted-mean']),
  resultIds: ids,
  coefficientOnCommonArea: number,
  coefficientOnOwnArea: number,
  ownAreaCoefficientStandardUncertainty: number,
  combination: z
    .strictObject({
      weights: z.array(number),
      chiSquared: number,
      birgeRatio: number.nullable(),
      betweenResultsVarianceM4: number,
      randomEffectsMeanM2: number,
    })
    .optional(),
});

export const variantEnergySchema = z.strictObject({
  variantId: z.string(),
  f0N: number,
  f1NPerKmh: number,
  f2NPerKmh2: number,
  wheelEnergyJ: number,
  brakingEnergyJ: number,
  distanceM: number,
  wheelEnergyWhPerKm: number,
  exchangeRateJPerM2: number,
  standardUncertaintyJ: number,
});

/** Output of the operation `reduce`. */
export const reduceOutputSchema = z.strictObject(reduceFields) satisfies z.ZodType<ReduceOutput>;

/** Output of the operation `rank`. The energy fields are there when a cycle was asked for. */
export const rankOutputSchema = z.strictObject({
  referenceReynolds: number,
  referenceAirDensityKgM3: number,
  ...reduceFields,
  variantsWithoutEvidence: z.array(
    z.strictObject({ variantId: z.string(), rule: z.literal('no-usable-evidence') }),
  ),
  ranking: z.array(rankedVariantSchema),
  orderByDragArea: ids,
  orderByOwnAreaCoefficient: ids,
  ownAreaOrderDisagrees: z.boolean(),
  probabilityLowerThanLaterOnes: z.array(z.array(number)),
  inseparableGroups: z.array(ids),
  probabilityLowest: z.record(z.string(), number),
  energy: z.array(variantEnergySchema).optional(),
  orderByEnergy: ids.optional(),
  energyOrderDisagrees: z.boolean().optional(),
  inseparableGroupsByEnergy: z.array(ids).optional(),
  energyProbabilityLowerThanNext: z.array(number).optional(),
}) satisfies z.ZodType<RankOutput>;
