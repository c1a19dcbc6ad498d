import * as z from 'zod';
import type { CorrelationOperationInput } from '#shared/core/correlation/correlation-operation';
import { figureInputSchema, uncertaintySchema } from './figure';

export const correlationPairSchema = z.strictObject({
  dragAreaM2: z.number().positive(),
  uM2: uncertaintySchema,
  referenceDragAreaM2: z.number().positive(),
  referenceUM2: uncertaintySchema,
});

/** Input of the operation `correlation`. */
export const correlationInputSchema = z.strictObject({
  pairs: z.array(correlationPairSchema),
  figure: figureInputSchema.nullish().describe('To be carried through; needs correlationId and variantId'),
  correlationId: z.string().nullish(),
  variantId: z.string().nullish(),
  dropKeys: z.array(z.string()).nullish(),
  referenceFacilityBias: z
    .strictObject({
      key: z.string(),
      uRelative: uncertaintySchema.nullish(),
      uM2: uncertaintySchema.nullish(),
    })
    .nullish(),
}) satisfies z.ZodType<CorrelationOperationInput>;
