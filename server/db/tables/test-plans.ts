import { index, integer, jsonb, pgTable, text, uuid } from 'drizzle-orm/pg-core';
import type { TestPlanInputs } from '#shared/contracts/test-plans';
import { byMember, tenantKey, tenantRules, within } from './columns';
import { instant } from './database-terms';
import { facilities } from './facilities';
import { programmes } from './programmes';
import { variants } from './variants';

/** A planned test: with what, where, at which speed. While it is expected, results to come are held against it. */
export const testPlans = pgTable(
  'test_plans',
  {
    ...tenantKey(),
    programmeId: uuid('programme_id').notNull(),
    variantId: uuid('variant_id').notNull(),
    facilityId: uuid('facility_id').notNull(),
    name: text('name').notNull(),
    inputs: jsonb('inputs').$type<TestPlanInputs>().notNull(),
    expectedSince: instant('expected_since'),
    version: integer('version').notNull().default(1),
    retiredAt: instant('retired_at'),
    createdBy: uuid('created_by').notNull(),
    createdAt: instant('created_at').notNull().defaultNow(),
  },
  (t) => [
    ...tenantRules('test_plans', t),
    within('test_plans_programme', t.organisationId, t.programmeId, programmes),
    within('test_plans_variant', t.organisationId, t.variantId, variants),
    within('test_plans_facility', t.organisationId, t.facilityId, facilities),
    byMember('test_plans', t.organisationId, t.createdBy),
    index('test_plans_programme_idx').on(t.organisationId, t.programmeId),
  ],
);
