import * as z from 'zod';
import {
  fraction,
  id,
  isoDate,
  name,
  nothing,
  notNegative,
  positive,
  programmeParams,
  remark,
  timestamp,
  variantParams,
  version,
} from './common';
import { endpoint } from './endpoint';

export const BODY_SHAPES = [
  'hatch',
  'liftback',
  'saloon',
  'estate',
  'crossover',
  'coupe',
  'van',
  'pickup',
  'other',
] as const;

/** Frontal areas have a history: the newest by date is the one that counts. */
export const frontalArea = z.strictObject({
  areaM2: z.number().positive().max(20),
  uM2: notNegative.max(1),
  method: z.enum(['projected-image', 'laser', 'cad', 'estimate']),
  date: isoDate,
  remark: remark.optional(),
});
export type FrontalArea = z.infer<typeof frontalArea>;

export const roadLoadReference = z.strictObject({
  f0N: z.number(),
  f1NPerKmh: z.number(),
  f2NPerKmh2: z.number(),
  massKg: positive,
  dragAreaM2: positive,
  airDensityKgM3: positive,
});

export const electricInputs = z.strictObject({
  driveEfficiency: z.number().positive().max(1),
  regenerationEfficiency: fraction,
  regenerationPowerLimitW: notNegative,
  auxiliaryPowerW: notNegative,
  chargingEfficiency: z.number().positive().max(1),
  usableEnergyKWh: positive,
});

export const combustionInputs = z.strictObject({
  driveEfficiency: z.number().positive().max(1),
  willansSlopeEfficiency: z.number().positive().max(1),
  zeroOutputPowerW: notNegative,
  overrunCut: z.boolean(),
  stopStart: z.boolean(),
  fuel: z.strictObject({
    name,
    heatingValueJPerKg: positive,
    densityKgPerL: positive,
    co2KgPerKg: notNegative,
  }),
});

/** One way in which the variant is sold: mass, road load, powertrain and share of volume. */
export const configurationFields = z.strictObject({
  name,
  massKg: z.number().positive().max(60000),
  rollingResistance: z.number().positive().max(0.1).optional(),
  roadLoadReference: roadLoadReference.optional(),
  electric: electricInputs.optional(),
  combustion: combustionInputs.optional(),
  salesShare: fraction,
});
export const configuration = configurationFields.extend({ id });
export type Configuration = z.infer<typeof configuration>;

export const variantFields = z.strictObject({
  name,
  bodyShape: z.enum(BODY_SHAPES),
  description: z.string().trim().max(200).optional(),
  lengthMm: z.number().positive().max(30000).optional(),
  widthMm: z.number().positive().max(5000).optional(),
  heightMm: z.number().positive().max(6000).optional(),
  wheelbaseMm: z.number().positive().max(20000).optional(),
  /** Names by which this variant goes in files that people import. */
  aliases: z.array(z.string().trim().min(1).max(120)).max(40),
  frontalAreas: z.array(frontalArea).min(1).max(60),
  /**
   * The first is the base configuration, which the ranking uses unless another is chosen. May be empty: a variant that an
   * import created is ranked by drag area before anybody has typed its mass.
   */
  configurations: z.array(configurationFields.extend({ id: id.optional() })).max(40),
  pictureAttachmentId: id.optional(),
});
export type VariantFields = z.infer<typeof variantFields>;

export const variant = variantFields.extend({
  id,
  programmeId: id,
  version,
  configurations: z.array(configuration),
  retiredAt: timestamp.optional(),
});
export type Variant = z.infer<typeof variant>;

export const variantList = endpoint({
  kind: 'json',
  method: 'GET',
  path: '/api/v1/programmes/:programmeId/variants',
  summary: 'The variants of a programme, retired ones included',
  access: 'variants.read',
  params: programmeParams,
  query: nothing,
  body: nothing,
  response: z.strictObject({ variants: z.array(variant) }),
  command: false,
  versioned: false,
  problems: [],
});

export const variantRead = endpoint({
  kind: 'json',
  method: 'GET',
  path: '/api/v1/programmes/:programmeId/variants/:variantId',
  summary: 'One variant with its dimensions, frontal areas and configurations',
  access: 'variants.read',
  params: variantParams,
  query: nothing,
  body: nothing,
  response: variant,
  command: false,
  versioned: false,
  problems: [],
});

export const variantCreate = endpoint({
  kind: 'json',
  method: 'POST',
  path: '/api/v1/programmes/:programmeId/variants',
  summary: 'Add a variant',
  access: 'variants.edit',
  params: programmeParams,
  query: nothing,
  body: variantFields,
  response: variant,
  command: true,
  versioned: false,
  problems: ['already-exists', 'unusable-input'],
});

export const variantUpdate = endpoint({
  kind: 'json',
  method: 'PUT',
  path: '/api/v1/programmes/:programmeId/variants/:variantId',
  summary: 'Change a variant',
  access: 'variants.edit',
  params: variantParams,
  query: nothing,
  body: variantFields,
  response: variant,
  command: true,
  versioned: true,
  problems: ['already-exists', 'conflict', 'unusable-input'],
});

export const variantRetire = endpoint({
  kind: 'json',
  method: 'POST',
  path: '/api/v1/programmes/:programmeId/variants/:variantId/retirement',
  summary: 'Retire a variant, or bring it back',
  access: 'variants.edit',
  params: variantParams,
  query: nothing,
  body: z.strictObject({ retired: z.boolean() }),
  response: variant,
  command: true,
  versioned: true,
  problems: ['conflict'],
});
