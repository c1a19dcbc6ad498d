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
import type { Condition } from '#shared/contracts/condition';
import { FACILITY_KINDS, type FacilityFields } from '#shared/contracts/facilities';
import { tenantKey, tenantRules, within } from './columns';
import { instant } from './database-terms';

/** Tunnels, simulation set-ups and proving grounds with their corrections and uncertainties. */
export const facilities = pgTable(
  'facilities',
  {
    ...tenantKey(),
    name: text('name').notNull(),
    kind: text('kind', { enum: FACILITY_KINDS }).notNull(),
    areaM2: doublePrecision('area_m2'),
    blockage: jsonb('blockage').$type<NonNullable<FacilityFields['blockage']>>(),
    usualCondition: jsonb('usual_condition').$type<Condition>().notNull(),
    biasURelative: doublePrecision('bias_u_relative'),
    biasUM2: doublePrecision('bias_u_m2'),
    sessionURelative: doublePrecision('session_u_relative'),
    sessionUM2: doublePrecision('session_u_m2'),
    sessionDegreesOfFreedom: doublePrecision('session_degrees_of_freedom'),
    installationURelative: doublePrecision('installation_u_relative'),
    installationUM2: doublePrecision('installation_u_m2'),
    installationDegreesOfFreedom: doublePrecision('installation_degrees_of_freedom'),
    repeatabilityURelative: doublePrecision('repeatability_u_relative'),
    repeatabilityDegreesOfFreedom: doublePrecision('repeatability_degrees_of_freedom'),
    remark: text('remark'),
    version: integer('version').notNull().default(1),
    retiredAt: instant('retired_at'),
    createdAt: instant('created_at').notNull().defaultNow(),
  },
  (t) => [
    ...tenantRules('facilities', t),
    uniqueIndex('facilities_name_key').on(t.organisationId, sql`lower(${t.name})`),
    check('facilities_kind_check', sql`${t.kind} in ('closed', 'open-jet', 'slotted', 'road', 'simulation')`),
    check('facilities_area_check', sql`${t.areaM2} > 0`),
  ],
);

/** One entry in a facility: results of one session share its error. */
export const testSessions = pgTable(
  'test_sessions',
  {
    ...tenantKey(),
    facilityId: uuid('facility_id').notNull(),
    name: text('name').notNull(),
    startDate: date('start_date', { mode: 'string' }),
    endDate: date('end_date', { mode: 'string' }),
    createdAt: instant('created_at').notNull().defaultNow(),
  },
  (t) => [
    ...tenantRules('test_sessions', t),
    within('test_sessions_facility', t.organisationId, t.facilityId, facilities),
    uniqueIndex('test_sessions_name_key').on(t.organisationId, t.facilityId, sql`lower(${t.name})`),
    unique('test_sessions_facility_id_key').on(t.organisationId, t.facilityId, t.id),
    index('test_sessions_facility_idx').on(t.organisationId, t.facilityId),
    check('test_sessions_dates_check', sql`${t.endDate} >= ${t.startDate}`),
  ],
);
