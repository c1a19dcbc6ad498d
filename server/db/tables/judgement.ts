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
import { CORRELATION_REPLACES, type CorrelationPair } from '#shared/contracts/correlations';
import type { PolicyValues } from '#shared/contracts/policies';
import type { JudgementChange, ProposalOutcome } from '#shared/contracts/proposals';
import { BODY_SHAPES } from '#shared/contracts/variants';
import type { EvaluationOutput, EvaluationParameters } from '#shared/core/ranking/evaluation-output';
import { attachments } from './attachments';
import { byMember, tenantKey, tenantRules, within } from './columns';
import { instant } from './database-terms';
import { facilities } from './facilities';
import { programmes } from './programmes';
import { adoptions } from './results';
import { variants } from './variants';

/** The organisation's limits, whole in each row; the newest number counts. */
export const policyVersions = pgTable(
  'policy_versions',
  {
    ...tenantKey(),
    number: integer('number').notNull(),
    values: jsonb('values').$type<PolicyValues>().notNull(),
    comment: text('comment').notNull(),
    createdBy: uuid('created_by').notNull(),
    createdAt: instant('created_at').notNull().defaultNow(),
  },
  (t) => [
    ...tenantRules('policy_versions', t),
    byMember('policy_versions', t.organisationId, t.createdBy),
    unique('policy_versions_number_key').on(t.organisationId, t.number),
  ],
);

/** What one item of the test condition is worth, with the evidence for it (method section 8). */
export const adjustments = pgTable(
  'adjustments',
  {
    ...tenantKey(),
    name: text('name').notNull(),
    item: text('item').notNull(),
    fromValue: jsonb('from_value').$type<string | number | boolean>(),
    toValue: jsonb('to_value').$type<string | number | boolean>(),
    deltaDragAreaM2: doublePrecision('delta_drag_area_m2'),
    uM2: doublePrecision('u_m2'),
    perUnitDragAreaM2: doublePrecision('per_unit_drag_area_m2'),
    uPerUnitM2: doublePrecision('u_per_unit_m2'),
    degreesOfFreedom: doublePrecision('degrees_of_freedom'),
    /** Empty: every body shape. */
    bodyShapes: text('body_shapes', { enum: BODY_SHAPES }).array().notNull(),
    evidence: text('evidence').notNull(),
    attachmentId: uuid('attachment_id'),
    version: integer('version').notNull().default(1),
    retiredAt: instant('retired_at'),
    createdBy: uuid('created_by').notNull(),
    createdAt: instant('created_at').notNull().defaultNow(),
  },
  (t) => [
    ...tenantRules('adjustments', t),
    within('adjustments_attachment', t.organisationId, t.attachmentId, attachments),
    byMember('adjustments', t.organisationId, t.createdBy),
    uniqueIndex('adjustments_name_key').on(t.organisationId, sql`lower(${t.name})`),
  ],
);

/** A facility (or simulation set-up) brought to another one; what it says stands in its versions. */
export const correlations = pgTable(
  'correlations',
  {
    ...tenantKey(),
    name: text('name').notNull(),
    facilityId: uuid('facility_id').notNull(),
    referenceFacilityId: uuid('reference_facility_id').notNull(),
    retiredAt: instant('retired_at'),
    createdBy: uuid('created_by').notNull(),
    createdAt: instant('created_at').notNull().defaultNow(),
  },
  (t) => [
    ...tenantRules('correlations', t),
    within('correlations_facility', t.organisationId, t.facilityId, facilities),
    within('correlations_reference_facility', t.organisationId, t.referenceFacilityId, facilities),
    byMember('correlations', t.organisationId, t.createdBy),
    uniqueIndex('correlations_name_key').on(t.organisationId, sql`lower(${t.name})`),
  ],
);

/** The pairs of a correlation as they stood, and which steps it replaces. Never changed. */
export const correlationVersions = pgTable(
  'correlation_versions',
  {
    ...tenantKey(),
    correlationId: uuid('correlation_id').notNull(),
    number: integer('number').notNull(),
    replaces: text('replaces', { enum: CORRELATION_REPLACES }).array().notNull(),
    pairs: jsonb('pairs').$type<readonly CorrelationPair[]>().notNull(),
    comment: text('comment').notNull(),
    createdBy: uuid('created_by').notNull(),
    createdAt: instant('created_at').notNull().defaultNow(),
  },
  (t) => [
    ...tenantRules('correlation_versions', t),
    within('correlation_versions_correlation', t.organisationId, t.correlationId, correlations),
    byMember('correlation_versions', t.organisationId, t.createdBy),
    unique('correlation_versions_number_key').on(t.organisationId, t.correlationId, t.number),
    unique('correlation_versions_correlation_id_key').on(t.organisationId, t.correlationId, t.id),
  ],
);

/** Which version of a correlation is used from when on; the newest row counts, one without a version ends its use. */
export const correlationAdoptions = pgTable(
  'correlation_adoptions',
  {
    ...tenantKey(),
    correlationId: uuid('correlation_id').notNull(),
    versionId: uuid('version_id'),
    effectiveDate: date('effective_date', { mode: 'string' }).notNull(),
    comment: text('comment').notNull(),
    adoptedBy: uuid('adopted_by').notNull(),
    adoptedAt: instant('adopted_at')
      .notNull()
      .default(sql`clock_timestamp()`),
  },
  (t) => [
    ...tenantRules('correlation_adoptions', t),
    within('correlation_adoptions_correlation', t.organisationId, t.correlationId, correlations),
    foreignKey({
      name: 'correlation_adoptions_version_fkey',
      columns: [t.organisationId, t.correlationId, t.versionId],
      foreignColumns: [
        correlationVersions.organisationId,
        correlationVersions.correlationId,
        correlationVersions.id,
      ],
    }),
    byMember('correlation_adoptions', t.organisationId, t.adoptedBy),
    index('correlation_adoptions_idx').on(t.organisationId, t.correlationId, t.adoptedAt),
  ],
);

/** What an adopted figure was computed from and came to: canonical text of the inputs, methods, rounded output. */
export const evaluations = pgTable(
  'evaluations',
  {
    ...tenantKey(),
    programmeId: uuid('programme_id').notNull(),
    variantId: uuid('variant_id').notNull(),
    adoptionId: uuid('adoption_id').notNull(),
    inputs: text('inputs').notNull(),
    inputsHash: text('inputs_hash').notNull(),
    methods: text('methods').array().notNull(),
    parameters: jsonb('parameters').$type<EvaluationParameters>().notNull(),
    output: jsonb('output').$type<EvaluationOutput>().notNull(),
    createdBy: uuid('created_by').notNull(),
    createdAt: instant('created_at').notNull().defaultNow(),
  },
  (t) => [
    ...tenantRules('evaluations', t),
    within('evaluations_programme', t.organisationId, t.programmeId, programmes),
    within('evaluations_variant', t.organisationId, t.variantId, variants),
    within('evaluations_adoption', t.organisationId, t.adoptionId, adoptions),
    byMember('evaluations', t.organisationId, t.createdBy),
    unique('evaluations_adoption_key').on(t.organisationId, t.adoptionId),
    index('evaluations_variant_idx').on(t.organisationId, t.variantId),
  ],
);

/** Changes of judgement that a person tried and puts before a colleague. */
export const proposals = pgTable(
  'proposals',
  {
    ...tenantKey(),
    programmeId: uuid('programme_id').notNull(),
    title: text('title').notNull(),
    comment: text('comment').notNull(),
    changes: jsonb('changes').$type<readonly JudgementChange[]>().notNull(),
    /** What it came to when it was made, and what it stood on. */
    outcome: jsonb('outcome').$type<ProposalOutcome>().notNull(),
    createdBy: uuid('created_by').notNull(),
    createdAt: instant('created_at').notNull().defaultNow(),
  },
  (t) => [
    ...tenantRules('proposals', t),
    within('proposals_programme', t.organisationId, t.programmeId, programmes),
    byMember('proposals', t.organisationId, t.createdBy),
    index('proposals_programme_idx').on(t.organisationId, t.programmeId, t.createdAt),
  ],
);

/** The end of a proposal. */
export const proposalDecisions = pgTable(
  'proposal_decisions',
  {
    ...tenantKey(),
    proposalId: uuid('proposal_id').notNull(),
    verdict: text('verdict', { enum: ['accepted', 'dropped'] }).notNull(),
    comment: text('comment').notNull(),
    decidedBy: uuid('decided_by').notNull(),
    decidedAt: instant('decided_at').notNull().defaultNow(),
  },
  (t) => [
    ...tenantRules('proposal_decisions', t),
    within('proposal_decisions_proposal', t.organisationId, t.proposalId, proposals),
    byMember('proposal_decisions', t.organisationId, t.decidedBy),
    unique('proposal_decisions_proposal_key').on(t.organisationId, t.proposalId),
    check('proposal_decisions_verdict_check', sql`${t.verdict} in ('accepted', 'dropped')`),
  ],
);
