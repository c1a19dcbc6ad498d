import * as z from 'zod';
import '../zod-setup';

/** Above 0; absent or null means infinite. The message is the refusal's code. */
export const degreesOfFreedomSchema = z.number().gt(0, { error: 'degrees-of-freedom' }).nullish();

/** A standard uncertainty. */
export const uncertaintySchema = z.number().min(0);

export const figureInputSchema = z.strictObject({
  dragAreaM2: z.number(),
  contributions: z
    .array(
      z.strictObject({
        key: z.string(),
        amountM2: z.number().describe('Signed'),
        degreesOfFreedom: degreesOfFreedomSchema,
        varianceEstimate: z.string().nullish(),
      }),
    )
    .nullish(),
});

/** A figure as it is put out, with its budget sorted by key. */
export const figureSchema = z.strictObject({
  dragAreaM2: z.number(),
  standardUncertaintyM2: z.number(),
  effectiveDegreesOfFreedom: z.number().nullable(),
  coverageFactor: z.number(),
  expandedUncertaintyM2: z.number(),
  contributions: z.array(
    z.strictObject({
      key: z.string(),
      amountM2: z.number(),
      degreesOfFreedom: z.number().nullable(),
      shareOfVariance: z.number(),
      varianceEstimate: z.string().optional(),
    }),
  ),
});
