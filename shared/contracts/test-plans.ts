import * as z from 'zod';
import { condition } from './condition';
import { name, positive, remark } from './common';

/** What a test is planned with; the facility and the variant are named beside it. */
export const testPlanInputs = z.strictObject({
  scale: z.number().positive().max(1),
  targetReynolds: positive.optional(),
  acceptedReynolds: positive.optional().describe('What a measured sweep says can be accepted instead'),
  speedKmh: positive.max(1500).optional().describe('The speed that is settled on'),
  tunnelTemperatureC: z.number(),
  tunnelPressurePa: z.number(),
  maximumSpeedKmh: positive.optional(),
  maximumForceN: positive.optional().describe('What the force balance carries'),
  dragCoefficient: positive,
  coefficientAreaM2: positive.optional(),
  coolingGas: z.enum(['air', 'nitrogen']).optional(),
  turbulence: z.boolean().optional().describe('Added turbulence or trips are planned'),
  condition,
  title: name.optional(),
  remark: remark.optional(),
});
export type TestPlanInputs = z.infer<typeof testPlanInputs>;
