import * as z from 'zod';
import type { ReynoldsSweepInput } from '#shared/core/similarity/reynolds-sweep-operation';
import '../zod-setup';

export const sweepPointSchema = z.strictObject({
  reynolds: z.number().positive(),
  dragAreaM2: z.number().positive(),
});

/** Input of the operation `reynolds-sweep`. */
export const reynoldsSweepInputSchema = z.strictObject({
  points: z.array(sweepPointSchema),
  referenceReynolds: z.number().positive(),
  toleranceM2: z.number().positive(),
  minimumReynolds: z.number().nullish(),
  result: z
    .strictObject({ reynolds: z.number(), dragAreaM2: z.number() })
    .nullish()
    .describe('A result outside the sweep, to be moved along it'),
}) satisfies z.ZodType<ReynoldsSweepInput>;
