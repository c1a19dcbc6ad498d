import * as z from 'zod';
import type { PlanInput } from '#shared/core/planning/planning-setting';
import { airInputSchema } from './air';

const number = z.number();

/** Input of the operation `plan`. */
export const planInputSchema = z.strictObject({
  scale: number.describe('Model length over full length, above 0, at most 1'),
  characteristicLengthM: number.positive().describe('At full scale'),
  referenceSpeedKmh: number.positive(),
  referenceAir: airInputSchema,
  targetReynolds: number
    .nullish()
    .describe('Absent: that of the full-size vehicle at the reference speed and air'),
  tunnelAir: z.strictObject({
    temperatureC: number.describe('−40 to 60 °C'),
    pressurePa: number.describe('Static, 30 000 to 1 000 000 Pa'),
  }),
  facility: z.strictObject({
    id: z.string().nullish(),
    name: z.string().nullish(),
    kind: z.enum(['closed', 'open-jet', 'slotted']),
    areaM2: number,
    maximumSpeedKmh: number.positive().nullish(),
  }),
  frontalAreaM2: number.positive(),
  dragCoefficient: number.positive(),
  coefficientAreaM2: number.nullish().describe('At full scale; absent: the frontal area'),
  machCaution: number.nullish(),
  machLimit: number.nullish(),
  minimumReynolds: number.nullish(),
  coolingGas: z.enum(['air', 'nitrogen']).nullish(),
}) satisfies z.ZodType<PlanInput>;
