import { sql } from 'drizzle-orm';
import {
  bigint,
  boolean,
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
  uuid,
} from 'drizzle-orm/pg-core';
import type { AirState, Condition } from '#shared/contracts/condition';
import { EVIDENCE_RULES, type ReynoldsChoice } from '#shared/contracts/judgements';
import { attachments } from './attachments';
import { byMember, tenantKey, tenantRules, within } from './columns';
import { instant } from './database-terms';
import { facilities, testSessions } from './facilities';
import { imports } from './imports';
import { programmes } from './programmes';
import { variants } from './variants';

export const RESULT_QUANTITIES = ['force', 'coefficient', 'drag-area', 'coastdown-f2'] as const;
export const AREA_SCALES = ['model', 'full'] as const;

/** An uncertainty as the source states it. */
export interface StatedUncertainty {
  readonly expandedU: number;
  readonly k: number;
  readonly degreesOfFreedom?: number;
  readonly includesFacilityBias?: boolean;
}

/** What was measured, in the form in which it came. Rows are never changed: a withdrawal is a row of its own. */
export const results = pgTable(
  'results',
  {
    ...tenantKey(),
    programmeId: uuid('programme_id').notNull(),
    variantId: uuid('variant_id').notNull(),
    facilityId: uuid('facility_id').notNull(),
    testSessionId: uuid('test_session_id'),
    installation: text('installation'),
    /** Rises by one with every result of the organisation: which of two is the newer. */
    entrySequence: bigint('entry_sequence', { mode: 'number' }).notNull(),
    name: text('name').notNull(),
    testDate: date('test_date', { mode: 'string' }).notNull(),
    quantity: text('quantity', { enum: RESULT_QUANTITIES }).notNull(),
    scale: doublePrecision('scale').notNull().default(1),
    quotedAreaM2: doublePrecision('quoted_area_m2'),
    quotedAreaUM2: doublePrecision('quoted_area_u_m2'),
    quotedAreaScale: text('quoted_area_scale', { enum: AREA_SCALES }),
    speedKmh: doublePrecision('speed_kmh'),
    dynamicPressurePa: doublePrecision('dynamic_pressure_pa'),
    air: jsonb('air').$type<AirState>(),
    tareAlreadySubtracted: boolean('tare_already_subtracted'),
    tareN: doublePrecision('tare_n'),
    condition: jsonb('condition').$type<Condition>().notNull(),
    blockageAlreadyCorrectedBy: text('blockage_already_corrected_by'),
    turbulenceOrTrips: boolean('turbulence_or_trips'),
    stated: jsonb('stated').$type<StatedUncertainty>(),
    modelId: text('model_id'),
    source: text('source'),
    remark: text('remark'),
    importId: uuid('import_id'),
    importRow: integer('import_row'),
    attachmentId: uuid('attachment_id'),
    createdBy: uuid('created_by').notNull(),
    createdAt: instant('created_at').notNull().defaultNow(),
  },
  (t) => [
    ...tenantRules('results', t),
    foreignKey({
      name: 'results_variant_fkey',
      columns: [t.organisationId, t.programmeId, t.variantId],
      foreignColumns: [variants.organisationId, variants.programmeId, variants.id],
    }),
    foreignKey({
      name: 'results_test_session_fkey',
      columns: [t.organisationId, t.facilityId, t.testSessionId],
      foreignColumns: [testSessions.organisationId, testSessions.facilityId, testSessions.id],
    }),
    within('results_programme', t.organisationId, t.programmeId, programmes),
    within('results_facility', t.organisationId, t.facilityId, facilities),
    within('results_import', t.organisationId, t.importId, imports),
    within('results_attachment', t.organisationId, t.attachmentId, attachments),
    byMember('results', t.organisationId, t.createdBy),
    unique('results_entry_sequence_key').on(t.organisationId, t.entrySequence),
    unique('results_variant_id_key').on(t.organisationId, t.variantId, t.id),
    index('results_programme_idx').on(t.organisationId, t.programmeId, t.entrySequence),
    index('results_variant_idx').on(t.organisationId, t.variantId),
    index('results_import_idx').on(t.organisationId, t.importId),
    check(
      'results_quantity_check',
      sql`${t.quantity} in ('force', 'coefficient', 'drag-area', 'coastdown-f2')`,
    ),
    check('results_area_scale_check', sql`${t.quotedAreaScale} in ('model', 'full')`),
    check('results_scale_check', sql`${t.scale} > 0`),
    check('results_quoted_area_check', sql`${t.quotedAreaM2} > 0`),
  ],
);

/** The values of a result, one per yaw angle (or one alone). */
export const resultPoints = pgTable(
  'result_points',
  {
    ...tenantKey(),
    resultId: uuid('result_id').notNull(),
    position: integer('position').notNull(),
    yawDeg: doublePrecision('yaw_deg').notNull().default(0),
    value: doublePrecision('value').notNull(),
    s: doublePrecision('s'),
    n: integer('n'),
    speedKmh: doublePrecision('speed_kmh'),
    dynamicPressurePa: doublePrecision('dynamic_pressure_pa'),
    tareN: doublePrecision('tare_n'),
    frontLift: doublePrecision('front_lift'),
    rearLift: doublePrecision('rear_lift'),
    sideForce: doublePrecision('side_force'),
  },
  (t) => [
    ...tenantRules('result_points', t),
    within('result_points_result', t.organisationId, t.resultId, results),
    unique('result_points_position_key').on(t.organisationId, t.resultId, t.position),
    check('result_points_s_check', sql`${t.s} >= 0`),
    check('result_points_n_check', sql`${t.n} >= 1`),
  ],
);

/** A result that no longer counts, with the reason; the result itself stays as it was. */
export const resultWithdrawals = pgTable(
  'result_withdrawals',
  {
    ...tenantKey(),
    resultId: uuid('result_id').notNull(),
    reason: text('reason').notNull(),
    withdrawnBy: uuid('withdrawn_by').notNull(),
    withdrawnAt: instant('withdrawn_at')
      .notNull()
      .default(sql`clock_timestamp()`),
  },
  (t) => [
    ...tenantRules('result_withdrawals', t),
    within('result_withdrawals_result', t.organisationId, t.resultId, results),
    byMember('result_withdrawals', t.organisationId, t.withdrawnBy),
    unique('result_withdrawals_result_key').on(t.organisationId, t.resultId),
  ],
);

/** What a variant rests on; the newest row per variant counts, one without `adoption_results` releases what stood. */
export const adoptions = pgTable(
  'adoptions',
  {
    ...tenantKey(),
    variantId: uuid('variant_id').notNull(),
    /** Newest of the adopted results, or their weighted mean (method section 10). */
    evidence: text('evidence', { enum: EVIDENCE_RULES }).notNull().default('newest'),
    comment: text('comment'),
    adoptedBy: uuid('adopted_by').notNull(),
    adoptedAt: instant('adopted_at')
      .notNull()
      .default(sql`clock_timestamp()`),
  },
  (t) => [
    ...tenantRules('adoptions', t),
    within('adoptions_variant', t.organisationId, t.variantId, variants),
    byMember('adoptions', t.organisationId, t.adoptedBy),
    unique('adoptions_variant_id_key').on(t.organisationId, t.variantId, t.id),
    check('adoptions_evidence_check', sql`${t.evidence} in ('newest', 'weighted-mean')`),
    index('adoptions_variant_idx').on(t.organisationId, t.variantId, t.adoptedAt),
  ],
);

/** The results that an adoption rests on. */
export const adoptionResults = pgTable(
  'adoption_results',
  {
    ...tenantKey(),
    adoptionId: uuid('adoption_id').notNull(),
    variantId: uuid('variant_id').notNull(),
    resultId: uuid('result_id').notNull(),
  },
  (t) => [
    ...tenantRules('adoption_results', t),
    foreignKey({
      name: 'adoption_results_adoption_fkey',
      columns: [t.organisationId, t.variantId, t.adoptionId],
      foreignColumns: [adoptions.organisationId, adoptions.variantId, adoptions.id],
    }),
    foreignKey({
      name: 'adoption_results_result_fkey',
      columns: [t.organisationId, t.variantId, t.resultId],
      foreignColumns: [results.organisationId, results.variantId, results.id],
    }),
    unique('adoption_results_key').on(t.organisationId, t.adoptionId, t.resultId),
    index('adoption_results_result_idx').on(t.organisationId, t.resultId),
  ],
);

/** That somebody looked a result through, or took that back; the newest row counts. */
export const resultStates = pgTable(
  'result_states',
  {
    ...tenantKey(),
    resultId: uuid('result_id').notNull(),
    state: text('state', { enum: ['entered', 'checked'] }).notNull(),
    comment: text('comment').notNull(),
    setBy: uuid('set_by').notNull(),
    setAt: instant('set_at')
      .notNull()
      .default(sql`clock_timestamp()`),
  },
  (t) => [
    ...tenantRules('result_states', t),
    within('result_states_result', t.organisationId, t.resultId, results),
    byMember('result_states', t.organisationId, t.setBy),
    index('result_states_result_idx').on(t.organisationId, t.resultId, t.setAt),
    check('result_states_state_check', sql`${t.state} in ('entered', 'checked')`),
  ],
);

/**
 * What an aerodynamicist holds of a result, whole in each row; the newest row counts. `includedReason` lets a result in
 * that is not comparable, `setAsideReason` keeps one out that would count.
 */
export const resultJudgements = pgTable(
  'result_judgements',
  {
    ...tenantKey(),
    resultId: uuid('result_id').notNull(),
    reynolds: jsonb('reynolds').$type<ReynoldsChoice>().notNull(),
    includedReason: text('included_reason'),
    setAsideReason: text('set_aside_reason'),
    comment: text('comment'),
    judgedBy: uuid('judged_by').notNull(),
    judgedAt: instant('judged_at')
      .notNull()
      .default(sql`clock_timestamp()`),
  },
  (t) => [
    ...tenantRules('result_judgements', t),
    within('result_judgements_result', t.organisationId, t.resultId, results),
    byMember('result_judgements', t.organisationId, t.judgedBy),
    index('result_judgements_result_idx').on(t.organisationId, t.resultId, t.judgedAt),
  ],
);
