import * as z from 'zod';
import type { CombineInput } from '#shared/core/combination/combine-operation';
import { degreesOfFreedomSchema, figureInputSchema, uncertaintySchema } from './figure';

const text = z.string();
const number = z.number();

/** The measured joint effect of several deltas, as `combine` and the variant's account take it. */
export const interactionInputSchema = z.strictObject({
  id: text,
  name: text.nullish(),
  deltaIds: z.array(text),
  jointDeltaDragAreaM2: number,
  uM2: uncertaintySchema,
  degreesOfFreedom: degreesOfFreedomSchema,
  basis: z.enum(['zero-yaw', 'wind-averaged']).nullish(),
  yawRatio: z.strictObject({ value: number.positive(), u: uncertaintySchema }).nullish(),
  carryOver: z.strictObject({ factor: number, u: uncertaintySchema }).nullish(),
});

/** Input of the operation `combine`. */
export const combineInputSchema = z.strictObject({
  variantId: text,
  results: z.array(
    figureInputSchema.extend({
      containsPostings: z.array(text).nullish().describe('Ids of postings that the geometry contains'),
    }),
  ),
  postings: z.array(figureInputSchema.extend({ id: text, name: text.nullish() })).nullish(),
  interactions: z.array(interactionInputSchema).nullish(),
}) satisfies z.ZodType<CombineInput>;
