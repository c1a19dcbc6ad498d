import { sql } from 'drizzle-orm';
import {
  check,
  doublePrecision,
  integer,
  jsonb,
  pgTable,
  text,
  uniqueIndex,
  uuid,
} from 'drizzle-orm/pg-core';
import { byMember, tenantKey, tenantRules } from './columns';
import { instant } from './database-terms';

/** What a trace adds up to, kept beside it so that a wrong trace is noticed. */
export interface CycleTotals {
  readonly durationS: number;
  readonly distanceM: number;
  readonly maximumSpeedKmh: number;
  readonly meanSpeedKmh: number;
  readonly maximumAccelerationMs2: number;
  readonly cautions: readonly string[];
}

const trace = () => ({
  name: text('name').notNull(),
  source: text('source').notNull(),
  timeS: doublePrecision('time_s').array().notNull(),
  speedKmh: doublePrecision('speed_kmh').array().notNull(),
  totals: jsonb('totals').$type<CycleTotals>().notNull(),
});

/** Outside tenants: the built-in cycles, known by name, written only by maintenance. */
export const referenceCycles = pgTable(
  'reference_cycles',
  {
    key: text('key').primaryKey(),
    /** The order in which they are offered. */
    position: integer('position').notNull().default(0),
    ...trace(),
  },
  (t) => [check('reference_cycles_trace_check', sql`cardinality(${t.timeS}) = cardinality(${t.speedKmh})`)],
);

/** An organisation's own speed traces. */
export const cycles = pgTable(
  'cycles',
  {
    ...tenantKey(),
    ...trace(),
    remark: text('remark'),
    retiredAt: instant('retired_at'),
    createdBy: uuid('created_by'),
    createdAt: instant('created_at').notNull().defaultNow(),
  },
  (t) => [
    ...tenantRules('cycles', t),
    byMember('cycles', t.organisationId, t.createdBy),
    uniqueIndex('cycles_name_key').on(t.organisationId, sql`lower(${t.name})`),
    check('cycles_trace_check', sql`cardinality(${t.timeS}) = cardinality(${t.speedKmh})`),
  ],
);
