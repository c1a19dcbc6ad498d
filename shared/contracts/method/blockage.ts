import * as z from 'zod';
import type { BlockageInput } from '#shared/core/reduction/blockage-operation';
import { blockageMethodSchema } from './ranking-input';

/** Input of the operation `blockage`. */
export const blockageInputSchema = z.strictObject({
  facility: z.strictObject({
    id: z.string().nullish(),
    name: z.string().nullish(),
    kind: z.enum(['closed', 'open-jet', 'slotted']),
    areaM2: z.number().positive(),
    blockage: blockageMethodSchema,
  }),
  scale: z.number().nullish(),
  frontalAreaM2: z.number().positive(),
  coefficient: z.number().positive(),
  quotedAreaM2: z.number().positive(),
  quotedAreaScale: z.enum(['model', 'full']),
}) satisfies z.ZodType<BlockageInput>;
