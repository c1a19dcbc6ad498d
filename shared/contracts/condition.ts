import * as z from 'zod';

/**
 * The test condition, item by item (method section 8). An item that a result does not state counts as different from
 * the programme's reference; an item that the programme does not state is not compared.
 */
export const GROUNDS = [
  'fixed-floor',
  'boundary-layer-control',
  'one-belt',
  'several-belts',
  'simulated-moving-ground',
  'road',
] as const;
export const WHEELS = ['stationary', 'rotating'] as const;
export const COOLINGS = ['open', 'closed', 'mock-up'] as const;
export const MIRRORS = ['fitted', 'removed'] as const;

export const condition = z.strictObject({
  ground: z.enum(GROUNDS).optional(),
  wheels: z.enum(WHEELS).optional(),
  cooling: z.enum(COOLINGS).optional(),
  mirrors: z.enum(MIRRORS).optional(),
  rideHeightFrontMm: z.number().optional(),
  rideHeightRearMm: z.number().optional(),
  payloadKg: z.number().min(0).optional(),
  tyres: z.string().trim().max(120).optional(),
  beltSpeedRatio: z.number().min(0).max(2).optional(),
  wheelVentilationInForce: z.boolean().optional(),
});
export type Condition = z.infer<typeof condition>;
export type ConditionItem = keyof Condition;

/** Where the air is that a figure refers to: a named reference state, or stated. */
export const AIR_STATES = ['iso-2533-sea-level', 'un-gtr-15', 'sae-j2263', 'cfr-1066-as-printed'] as const;

export const airState = z.strictObject({
  state: z.enum([...AIR_STATES, 'custom']).optional(),
  temperatureC: z.number().optional(),
  pressurePa: z.number().optional(),
  relativeHumidity: z.number().optional().describe('Fraction, 0 to 1'),
});
export type AirState = z.infer<typeof airState>;
