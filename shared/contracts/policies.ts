import * as z from 'zod';
import { BODY_SHAPES } from './variants';
import { fraction, notNegative, positive } from './common';

/** From … to … is plausible; outside it a person is asked to look again. */
const range = z.strictObject({ from: positive, to: positive });

/** What the organisation holds for acceptable: the limits of every check, and the friction share of the Reynolds step. */
export const policyValues = z.strictObject({
  machCaution: positive.max(1),
  machExcluded: positive.max(1),
  blockageCaution: fraction,
  blockageExcluded: fraction,
  openJetLimit: fraction,
  minimumReynolds: positive,
  reynoldsToleranceM2: positive.max(1),
  frictionShare: fraction,
  frictionShareU: fraction,
  /** A wind average needs yaw angles up to this one on both sides. */
  yawCoverageDeg: positive.max(90),
  /** Repeatability (relative to the drag area) above which a result is cautioned. */
  repeatabilityCaution: fraction,
  /** Static temperature [°C] and pressure [Pa] that a test hall usually has. */
  airTemperatureC: z.strictObject({ from: z.number(), to: z.number() }),
  airPressurePa: range,
  /** Largest lift coefficients, on the frontal area, front and rear. */
  frontLiftLimit: notNegative,
  rearLiftLimit: notNegative,
  /** Per body shape, what drag coefficient (on the frontal area) and frontal area [m²] are plausible. */
  plausible: z.array(
    z.strictObject({ bodyShape: z.enum(BODY_SHAPES), dragCoefficient: range, frontalAreaM2: range }),
  ),
});
export type PolicyValues = z.infer<typeof policyValues>;
