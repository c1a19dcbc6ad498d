import * as z from 'zod';
import type { FrictionLineInput } from '#shared/core/similarity/friction-line-operation';
import { uncertaintySchema } from './figure';

/** Input of the operation `friction-line`. */
export const frictionLineInputSchema = z.strictObject({
  dragAreaM2: z.number().positive(),
  testReynolds: z.number(),
  referenceReynolds: z.number(),
  frictionShare: z.number().nullish(),
  frictionShareU: uncertaintySchema.nullish(),
}) satisfies z.ZodType<FrictionLineInput>;
