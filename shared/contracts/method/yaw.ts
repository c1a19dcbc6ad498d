import * as z from 'zod';
import type { YawInput } from '#shared/core/reduction/yaw/yaw-ratio';
import { degreesOfFreedomSchema, uncertaintySchema } from './figure';

/** Input of the operation `yaw`. */
export const yawInputSchema = z.strictObject({
  points: z.array(
    z.strictObject({
      yawDeg: z.number(),
      dragAreaM2: z.number(),
      uM2: uncertaintySchema,
      degreesOfFreedom: degreesOfFreedomSchema,
    }),
  ),
  referenceSpeedKmh: z.number().positive(),
  windSpeedMs: z.number().nullish(),
}) satisfies z.ZodType<YawInput>;
