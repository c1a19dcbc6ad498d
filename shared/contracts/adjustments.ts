import * as z from 'zod';
import { degreesOfFreedom, finite, id, name, nothing, notNegative, timestamp, version } from './common';
import type { ConditionItem } from './condition';
import { endpoint } from './endpoint';
import { reason } from './judgements';
import { BODY_SHAPES } from './variants';

/** Items whose values are words: an adjustment names from which to which. */
export const CATEGORICAL_ITEMS = [
  'ground',
  'wheels',
  'cooling',
  'mirrors',
  'tyres',
  'wheelVentilationInForce',
] as const satisfies readonly ConditionItem[];

/** Items whose values are numbers: an adjustment says what one unit is worth. */
export const NUMERIC_ITEMS = [
  'rideHeightFrontMm',
  'rideHeightRearMm',
  'payloadKg',
  'beltSpeedRatio',
] as const satisfies readonly ConditionItem[];

export const adjustmentItem = z.enum([...CATEGORICAL_ITEMS, ...NUMERIC_ITEMS]);
export type AdjustmentItem = z.infer<typeof adjustmentItem>;

export const conditionValue = z.union([z.string().trim().min(1).max(120), z.number(), z.boolean()]);

/**
 * What a difference of one item of the test condition is worth (method section 8). Categorical: values, drag area and its u;
 * numeric: drag area per unit and its u. An adjustment that names body shapes goes before one that holds for every shape.
 */
export const adjustmentFields = z.strictObject({
  name,
  item: adjustmentItem,
  fromValue: conditionValue.optional().describe('Categorical items: what the result was measured with'),
  toValue: conditionValue.optional().describe('Categorical items: what the programme refers to'),
  deltaDragAreaM2: finite.optional().describe('Categorical items: added to a result measured with fromValue'),
  uM2: notNegative.optional().describe('Categorical items: standard uncertainty, above 0'),
  perUnitDragAreaM2: finite.optional().describe('Numeric items: m² per mm, kg or unit of the ratio'),
  uPerUnitM2: notNegative.optional().describe('Numeric items: standard uncertainty per unit, above 0'),
  degreesOfFreedom: degreesOfFreedom.optional(),
  bodyShapes: z.array(z.enum(BODY_SHAPES)).describe('Empty: every body shape'),
  evidence: reason.describe('What it rests on: the measurement, and where it is written down'),
  attachmentId: id.optional(),
});
export type AdjustmentFields = z.infer<typeof adjustmentFields>;

export const adjustment = adjustmentFields.extend({
  id,
  version,
  retiredAt: timestamp.optional(),
  addedAt: timestamp,
  addedBy: name,
});
export type Adjustment = z.infer<typeof adjustment>;

const adjustmentParams = z.strictObject({ adjustmentId: id });

export const adjustmentList = endpoint({
  kind: 'json',
  method: 'GET',
  path: '/api/v1/adjustments',
  summary:
    'What differences of the test condition are worth, in the order in which the first that fits is used',
  access: 'facilities.read',
  params: nothing,
  query: nothing,
  body: nothing,
  response: z.strictObject({ adjustments: z.array(adjustment).describe('Retired ones last') }),
  command: false,
  versioned: false,
  problems: [],
});

export const adjustmentRead = endpoint({
  kind: 'json',
  method: 'GET',
  path: '/api/v1/adjustments/:adjustmentId',
  summary: 'One adjustment with its evidence',
  access: 'facilities.read',
  params: adjustmentParams,
  query: nothing,
  body: nothing,
  response: adjustment,
  command: false,
  versioned: false,
  problems: [],
});

export const adjustmentCreate = endpoint({
  kind: 'json',
  method: 'POST',
  path: '/api/v1/adjustments',
  summary: 'Say what a difference of the test condition is worth',
  access: 'adjustments.edit',
  params: nothing,
  query: nothing,
  body: adjustmentFields,
  response: adjustment,
  command: true,
  versioned: false,
  problems: ['already-exists', 'unusable-input'],
});

export const adjustmentUpdate = endpoint({
  kind: 'json',
  method: 'PUT',
  path: '/api/v1/adjustments/:adjustmentId',
  summary: 'Change an adjustment; every figure that uses it moves with it',
  access: 'adjustments.edit',
  params: adjustmentParams,
  query: nothing,
  body: adjustmentFields,
  response: adjustment,
  command: true,
  versioned: true,
  problems: ['already-exists', 'conflict', 'unusable-input'],
});

export const adjustmentRetire = endpoint({
  kind: 'json',
  method: 'POST',
  path: '/api/v1/adjustments/:adjustmentId/retirement',
  summary: 'Take an adjustment out of use, or bring it back',
  access: 'adjustments.edit',
  params: adjustmentParams,
  query: nothing,
  body: z.strictObject({ retired: z.boolean() }),
  response: adjustment,
  command: true,
  versioned: true,
  problems: ['conflict', 'unusable-input'],
});
