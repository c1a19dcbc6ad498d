import * as z from 'zod';
import { name, nothing, remark, timestamp } from './common';
import { endpoint } from './endpoint';

/** A speed trace. Built-in ones are known by name and belong to nobody; own ones have an id and belong to the organisation. */
export const cycleSummary = z.strictObject({
  /** The built-in name (`wltc-class-3b`) or the id of an own cycle. */
  key: z.string(),
  origin: z.enum(['built-in', 'own']),
  name,
  source: z.string(),
  durationS: z.number(),
  distanceM: z.number(),
  maximumSpeedKmh: z.number(),
  meanSpeedKmh: z.number(),
  maximumAccelerationMs2: z.number(),
  cautions: z.array(z.string()),
  retiredAt: timestamp.optional(),
});
export type CycleSummary = z.infer<typeof cycleSummary>;

export const cycleDetail = cycleSummary.extend({
  timeS: z.array(z.number()),
  speedKmh: z.array(z.number()),
});
export type CycleDetail = z.infer<typeof cycleDetail>;

const cycleParams = z.strictObject({ cycleKey: z.string().min(1).max(60) });

export const cycleList = endpoint({
  kind: 'json',
  method: 'GET',
  path: '/api/v1/cycles',
  summary: 'The speed traces for energy, built in and own, with their totals',
  access: 'cycles.read',
  params: nothing,
  query: nothing,
  body: nothing,
  response: z.strictObject({ cycles: z.array(cycleSummary) }),
  command: false,
  versioned: false,
  problems: [],
});

export const cycleRead = endpoint({
  kind: 'json',
  method: 'GET',
  path: '/api/v1/cycles/:cycleKey',
  summary: 'One speed trace, point by point',
  access: 'cycles.read',
  params: cycleParams,
  query: nothing,
  body: nothing,
  response: cycleDetail,
  command: false,
  versioned: false,
  problems: [],
});

export const TIME_UNITS = ['s', 'min'] as const;
export const SPEED_UNITS = ['km/h', 'm/s', 'mph'] as const;

/** The CSV's text travels in the JSON body: a trace of five hours at 10 Hz stays under the limit. */
export const cycleCreate = endpoint({
  kind: 'json',
  method: 'POST',
  path: '/api/v1/cycles',
  summary: 'Bring in an own speed trace as CSV (time, speed); with `checkOnly` nothing is stored',
  access: 'cycles.edit',
  params: nothing,
  query: nothing,
  body: z.strictObject({
    name,
    remark: remark.optional(),
    csv: z.string().max(1_900_000),
    timeUnit: z.enum(TIME_UNITS),
    speedUnit: z.enum(SPEED_UNITS),
    checkOnly: z.boolean(),
  }),
  response: cycleDetail,
  command: true,
  versioned: false,
  problems: ['already-exists', 'unusable-input', 'too-large'],
});

export const cycleRetire = endpoint({
  kind: 'json',
  method: 'POST',
  path: '/api/v1/cycles/:cycleKey/retirement',
  summary: 'Retire an own cycle, or bring it back',
  access: 'cycles.edit',
  params: cycleParams,
  query: nothing,
  body: z.strictObject({ retired: z.boolean() }),
  response: cycleSummary,
  command: true,
  versioned: false,
  problems: ['wrong-state'],
});
