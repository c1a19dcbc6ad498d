import { sql } from 'drizzle-orm';
import {
  check,
  date,
  doublePrecision,
  index,
  integer,
  jsonb,
  pgTable,
  text,
  unique,
  uniqueIndex,
  uuid,
} from 'drizzle-orm/pg-core';
import { BODY_SHAPES, type Configuration } from '#shared/contracts/variants';
import { attachments } from './attachments';
import { tenantKey, tenantRules, within } from './columns';
import { instant } from './database-terms';
import { programmes } from './programmes';

/** A body variant of a programme. */
export const variants = pgTable(
  'variants',
  {
    ...tenantKey(),
    programmeId: uuid('programme_id').notNull(),
    name: text('name').notNull(),
    bodyShape: text('body_shape', { enum: BODY_SHAPES }).notNull(),
    description: text('description'),
    lengthMm: doublePrecision('length_mm'),
    widthMm: doublePrecision('width_mm'),
    heightMm: doublePrecision('height_mm'),
    wheelbaseMm: doublePrecision('wheelbase_mm'),
    aliases: text('aliases')
      .array()
      .notNull()
      .default(sql`'{}'::text[]`),
    pictureAttachmentId: uuid('picture_attachment_id'),
    version: integer('version').notNull().default(1),
    retiredAt: instant('retired_at'),
    createdAt: instant('created_at').notNull().defaultNow(),
  },
  (t) => [
    ...tenantRules('variants', t),
    within('variants_programme', t.organisationId, t.programmeId, programmes),
    within('variants_picture', t.organisationId, t.pictureAttachmentId, attachments),
    unique('variants_programme_id_key').on(t.organisationId, t.programmeId, t.id),
    uniqueIndex('variants_name_key').on(t.organisationId, t.programmeId, sql`lower(${t.name})`),
    check(
      'variants_dimensions_check',
      sql`${t.lengthMm} > 0 and ${t.widthMm} > 0 and ${t.heightMm} > 0 and ${t.wheelbaseMm} > 0`,
    ),
  ],
);

export const AREA_METHODS = ['projected-image', 'laser', 'cad', 'estimate'] as const;

/** The history of a variant's frontal area; the newest by date counts. */
export const frontalAreas = pgTable(
  'frontal_areas',
  {
    ...tenantKey(),
    variantId: uuid('variant_id').notNull(),
    position: integer('position').notNull(),
    areaM2: doublePrecision('area_m2').notNull(),
    uM2: doublePrecision('u_m2').notNull(),
    method: text('method', { enum: AREA_METHODS }).notNull(),
    date: date('date', { mode: 'string' }).notNull(),
    remark: text('remark'),
  },
  (t) => [
    ...tenantRules('frontal_areas', t),
    within('frontal_areas_variant', t.organisationId, t.variantId, variants),
    index('frontal_areas_variant_idx').on(t.organisationId, t.variantId, t.date),
    check('frontal_areas_area_check', sql`${t.areaM2} > 0 and ${t.uM2} >= 0`),
    check('frontal_areas_method_check', sql`${t.method} in ('projected-image', 'laser', 'cad', 'estimate')`),
  ],
);

/** One way in which a variant is sold; the first by position is the base. */
export const configurations = pgTable(
  'configurations',
  {
    ...tenantKey(),
    variantId: uuid('variant_id').notNull(),
    position: integer('position').notNull(),
    name: text('name').notNull(),
    massKg: doublePrecision('mass_kg').notNull(),
    rollingResistance: doublePrecision('rolling_resistance'),
    roadLoadReference: jsonb('road_load_reference').$type<NonNullable<Configuration['roadLoadReference']>>(),
    electric: jsonb('electric').$type<NonNullable<Configuration['electric']>>(),
    combustion: jsonb('combustion').$type<NonNullable<Configuration['combustion']>>(),
    salesShare: doublePrecision('sales_share').notNull(),
  },
  (t) => [
    ...tenantRules('configurations', t),
    within('configurations_variant', t.organisationId, t.variantId, variants),
    index('configurations_variant_idx').on(t.organisationId, t.variantId, t.position),
    check('configurations_mass_check', sql`${t.massKg} > 0`),
    check('configurations_share_check', sql`${t.salesShare} >= 0 and ${t.salesShare} <= 1`),
  ],
);
