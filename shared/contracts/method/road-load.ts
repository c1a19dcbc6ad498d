import * as z from 'zod';
import '../zod-setup';

/** A measured road load with the vehicle and air that it holds for. */
export const roadLoadReferenceSchema = z.strictObject({
  f0N: z.number(),
  f1NPerKmh: z.number(),
  f2NPerKmh2: z.number(),
  massKg: z.number().positive(),
  dragAreaM2: z.number().positive(),
  airDensityKgM3: z.number().positive(),
});
