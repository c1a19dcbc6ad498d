import * as z from 'zod';
import { finite, fraction, name, nothing, positive, timestamp } from './common';
import { endpoint } from './endpoint';
import { reason } from './judgements';
import { BODY_SHAPES } from './variants';

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
  frontLiftLimit: finite.min(-2).max(2),
  rearLiftLimit: finite.min(-2).max(2),
  /** Per body shape, what drag coefficient (on the frontal area) and frontal area [m²] are plausible. */
  plausible: z
    .array(z.strictObject({ bodyShape: z.enum(BODY_SHAPES), dragCoefficient: range, frontalAreaM2: range }))
    .max(BODY_SHAPES.length),
});
export type PolicyValues = z.infer<typeof policyValues>;

/** The limits as they hold, or held. Number 0: those that the product comes with, before anybody has changed one. */
export const policyVersion = z.strictObject({
  number: z.int().min(0),
  values: policyValues,
  /** Why, when and by whom; absent with number 0. */
  comment: reason.optional(),
  at: timestamp.optional(),
  by: name.optional(),
});
export type PolicyVersion = z.infer<typeof policyVersion>;

export const policiesRead = endpoint({
  kind: 'json',
  method: 'GET',
  path: '/api/v1/policies',
  summary: 'What the organisation holds for acceptable, every version; the first is the one in force',
  access: 'policies.read',
  params: nothing,
  query: nothing,
  body: nothing,
  response: z.strictObject({
    versions: z.array(policyVersion).min(1).describe('Newest first; number 0 is the last of the list'),
  }),
  command: false,
  versioned: false,
  problems: [],
});

export const policiesChange = endpoint({
  kind: 'json',
  method: 'POST',
  path: '/api/v1/policies',
  summary: 'Set the limits anew: a further version, in force at once. Earlier ones stay for what used them',
  access: 'policies.edit',
  params: nothing,
  query: nothing,
  body: z.strictObject({
    /** The version that the person saw; another one meanwhile is a conflict. */
    expectedNumber: z.int().min(0),
    values: policyValues,
    comment: reason,
  }),
  response: policyVersion,
  command: true,
  versioned: false,
  problems: ['conflict', 'unusable-input'],
});
