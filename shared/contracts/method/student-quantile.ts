import * as z from 'zod';
import '../zod-setup';
import { degreesOfFreedomSchema } from './figure';

/** Input of the operation `student-quantile`. */
export const studentQuantileInputSchema = z.strictObject({
  lowerTailProbability: z.number().describe('0 < p < 1'),
  degreesOfFreedom: degreesOfFreedomSchema,
});
