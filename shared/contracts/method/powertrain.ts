import * as z from 'zod';
import '../zod-setup';
import { airInputSchema } from './air';
import { cycleInputSchema } from './cycle';
import { roadLoadReferenceSchema } from './road-load';

const text = z.string();
const number = z.number();

const electricSchema = z.strictObject({
  driveEfficiency: number.positive().describe('Battery to wheel'),
  regenerationEfficiency: number.describe('Wheel to battery, including the share that is recovered at all'),
  regenerationPowerLimitW: number.describe('At the wheel'),
  auxiliaryPowerW: number,
  chargingEfficiency: number.positive().describe('Mains to battery'),
  usableEnergyKWh: number.positive(),
});

const combustionSchema = z.strictObject({
  driveEfficiency: number.positive().describe('Engine to wheel'),
  willansSlopeEfficiency: number.positive().describe('Slope of the Willans line, not the mean efficiency'),
  zeroOutputPowerW: number,
  overrunCut: z.boolean(),
  stopStart: z.boolean(),
  fuel: z.strictObject({
    heatingValueJPerKg: number.positive(),
    densityKgPerL: number.positive(),
    co2KgPerKg: number,
  }),
});

/** Input of the operation `powertrain`. */
export const powertrainInputSchema = z.strictObject({
  referenceAir: airInputSchema,
  commonAreaM2: number.positive().describe('The area that a count is taken on'),
  variant: z.strictObject({
    id: text.nullish(),
    name: text.nullish(),
    massKg: number.positive(),
    rollingResistance: number.nullish().describe('Needed where there is no roadLoadReference'),
    roadLoadReference: roadLoadReferenceSchema.nullish(),
  }),
  dragAreaM2: number.positive(),
  cycle: cycleInputSchema,
  rotatingFactor: number.nullish(),
  electric: electricSchema.nullish(),
  combustion: combustionSchema.nullish(),
});
