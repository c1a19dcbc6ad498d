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
import type { AirState, Condition } from '#shared/contracts/condition';
import type { CommonArea } from '#shared/contracts/programmes';
import { byMember, tenantKey, tenantRules, within } from './columns';
import { instant } from './database-terms';
import { facilities } from './facilities';

/** A vehicle programme: the one reference to which every result is reduced. */
export const programmes = pgTable(
  'programmes',
  {
    ...tenantKey(),
    name: text('name').notNull(),
    referenceSpeedKmh: doublePrecision('reference_speed_kmh').notNull(),
    referenceAir: jsonb('reference_air').$type<AirState>().notNull(),
    referenceCondition: jsonb('reference_condition').$type<Condition>().notNull(),
    characteristicLengthM: doublePrecision('characteristic_length_m').notNull(),
    characteristicLengthName: text('characteristic_length_name').notNull(),
    commonArea: jsonb('common_area').$type<CommonArea>(),
    confidence: doublePrecision('confidence').notNull(),
    windSpeedMs: doublePrecision('wind_speed_ms').notNull(),
    referenceFacilityId: uuid('reference_facility_id'),
    /** Whether results without a sweep are moved to the reference Reynolds number by the friction line. */
    frictionLine: text('friction_line', { enum: ['on', 'off'] })
      .notNull()
      .default('on'),
    remark: text('remark'),
    version: integer('version').notNull().default(1),
    retiredAt: instant('retired_at'),
    createdAt: instant('created_at').notNull().defaultNow(),
  },
  (t) => [
    ...tenantRules('programmes', t),
    within('programmes_reference_facility', t.organisationId, t.referenceFacilityId, facilities),
    uniqueIndex('programmes_name_key').on(t.organisationId, sql`lower(${t.name})`),
    check('programmes_speed_check', sql`${t.referenceSpeedKmh} > 0`),
    check('programmes_length_check', sql`${t.characteristicLengthM} > 0`),
    check('programmes_confidence_check', sql`${t.confidence} > 0 and ${t.confidence} < 1`),
    check('programmes_friction_line_check', sql`${t.frictionLine} in ('on', 'off')`),
    check('programmes_wind_check', sql`${t.windSpeedMs} >= 0`),
  ],
);

export const milestones = pgTable(
  'milestones',
  {
    ...tenantKey(),
    programmeId: uuid('programme_id').notNull(),
    name: text('name').notNull(),
    date: date('date', { mode: 'string' }).notNull(),
  },
  (t) => [
    ...tenantRules('milestones', t),
    within('milestones_programme', t.organisationId, t.programmeId, programmes),
    index('milestones_programme_idx').on(t.organisationId, t.programmeId, t.date),
  ],
);

/** The programmes that a person opened, newest first: where sign-in leads. */
export const recentProgrammes = pgTable(
  'recent_programmes',
  {
    ...tenantKey(),
    userId: uuid('user_id').notNull(),
    programmeId: uuid('programme_id').notNull(),
    at: instant('at').notNull().defaultNow(),
  },
  (t) => [
    ...tenantRules('recent_programmes', t),
    byMember('recent_programmes', t.organisationId, t.userId),
    within('recent_programmes_programme', t.organisationId, t.programmeId, programmes),
    unique('recent_programmes_user_key').on(t.organisationId, t.userId, t.programmeId),
  ],
);
