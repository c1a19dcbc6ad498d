import * as z from 'zod';
import '../zod-setup';

/** Null is the same as absent: a field of the other form may be there as null. */
const absent = z.null().optional();

/** A cycle in the input of an operation: a name, one constant speed, or rows of one's own. */
export const cycleInputSchema = z.union([
  z.string(),
  z.strictObject({
    constantSpeedKmh: z.number().positive(),
    durationS: z.number().positive(),
    timeS: absent,
    speedKmh: absent,
  }),
  z.strictObject({
    timeS: z.array(z.number()),
    speedKmh: z.array(z.number()),
    constantSpeedKmh: absent,
    durationS: absent,
  }),
]);
