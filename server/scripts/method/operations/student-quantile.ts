import { studentQuantileInputSchema } from '#shared/contracts/method/student-quantile';
import { studentQuantile as quantileOf } from '#shared/core/uncertainty/student';
import { operation } from '../operation';

export const studentQuantile = operation(
  studentQuantileInputSchema,
  ({ lowerTailProbability, degreesOfFreedom }) => ({
    quantile: quantileOf(lowerTailProbability, degreesOfFreedom ?? Infinity),
  }),
);
