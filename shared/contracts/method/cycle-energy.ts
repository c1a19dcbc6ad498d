import * as z from 'zod';
import '../zod-setup';
import { cycleInputSchema } from './cycle';

/** Input of the operation `cycle-energy`. */
export const cycleEnergyInputSchema = z.strictObject({
  cycle: cycleInputSchema,
  f0N: z.number(),
  f1NPerKmh: z.number(),
  f2NPerKmh2: z.number(),
  massKg: z.number().positive(),
  rotatingFactor: z.number().nullish(),
});
