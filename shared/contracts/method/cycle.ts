import * as z from 'zod';
import '../zod-setup';

/** A cycle in the input of an operation: a name, one constant speed, or rows of one's own. */
export const cycleInputSchema = z.union([
  z.string(),
  z.strictObject({ constantSpeedKmh: z.number().positive(), durationS: z.number().positive() }),
  z.strictObject({ timeS: z.array(z.number()), speedKmh: z.array(z.number()) }),
]);
