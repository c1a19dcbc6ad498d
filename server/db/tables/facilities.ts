import { sql } from 'drizzle-orm';
import {
  check,
  date,
  doublePrecision,
  foreignKey,
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
import { byMember, tenantKey, tenantRules, within } from './columns';
import { instant } from './database-terms';

/** A body of unchanging shape that is measured in every session of a facility. */
export interface CheckBody {
  readonly name: string;
  readonly remark?: string;
}

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
    /** The body that is measured in every session, and watches over the facility itself. */
    checkBody: jsonb('check_body').$type<CheckBody>(),
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
    remark: text('remark'),
    version: integer('version').notNull().default(1),
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

/** What a facility's corrections and uncertainties were, change by change; the newest is what the facility itself holds. */
export const facilityVersions = pgTable(
  'facility_versions',
  {
    ...tenantKey(),
    facilityId: uuid('facility_id').notNull(),
    number: integer('number').notNull(),
    fields: jsonb('fields').$type<FacilityFields>().notNull(),
    comment: text('comment'),
    createdBy: uuid('created_by'),
    createdAt: instant('created_at').notNull().defaultNow(),
  },
  (t) => [
    ...tenantRules('facility_versions', t),
    within('facility_versions_facility', t.organisationId, t.facilityId, facilities),
    byMember('facility_versions', t.organisationId, t.createdBy),
    unique('facility_versions_number_key').on(t.organisationId, t.facilityId, t.number),
  ],
);

/** A reading of the facility's check body in one session. One that was mistaken is struck out, not removed. */
export const checkMeasurements = pgTable(
  'check_measurements',
  {
    ...tenantKey(),
    facilityId: uuid('facility_id').notNull(),
    testSessionId: uuid('test_session_id').notNull(),
    measuredOn: date('measured_on', { mode: 'string' }).notNull(),
    /** Its name at the time: where the body is replaced, old readings stay the old body's. */
    checkBody: text('check_body').notNull(),
    dragAreaM2: doublePrecision('drag_area_m2').notNull(),
    s: doublePrecision('s'),
    n: integer('n'),
    remark: text('remark'),
    struckReason: text('struck_reason'),
    struckBy: uuid('struck_by'),
    struckAt: instant('struck_at'),
    createdBy: uuid('created_by').notNull(),
    createdAt: instant('created_at').notNull().defaultNow(),
  },
  (t) => [
    ...tenantRules('check_measurements', t),
    foreignKey({
      name: 'check_measurements_session_fkey',
      columns: [t.organisationId, t.facilityId, t.testSessionId],
      foreignColumns: [testSessions.organisationId, testSessions.facilityId, testSessions.id],
    }),
    byMember('check_measurements', t.organisationId, t.createdBy),
    byMember('check_measurements', t.organisationId, t.struckBy, 'struck_by'),
    index('check_measurements_facility_idx').on(t.organisationId, t.facilityId, t.measuredOn),
    check('check_measurements_drag_area_check', sql`${t.dragAreaM2} > 0`),
    check('check_measurements_s_check', sql`${t.s} >= 0`),
    check('check_measurements_n_check', sql`${t.n} >= 1`),
  ],
);
