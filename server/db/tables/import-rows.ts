import { sql } from 'drizzle-orm';
import { check, index, integer, jsonb, pgTable, text, unique, uuid } from 'drizzle-orm/pg-core';
import { tenantKey, tenantRules, within } from './columns';
import { imports } from './imports';

export const ROW_VERDICTS = ['accepted', 'cautioned', 'refused', 'skipped'] as const;

/** One row of an imported file with the verdict on it. `fixes` are cells that a person typed over. */
export const importRows = pgTable(
  'import_rows',
  {
    ...tenantKey(),
    importId: uuid('import_id').notNull(),
    rowNumber: integer('row_number').notNull(),
    cells: jsonb('cells').$type<readonly string[]>().notNull(),
    verdict: text('verdict', { enum: ROW_VERDICTS }),
    reasons: jsonb('reasons').$type<readonly unknown[]>().notNull().default([]),
    fixes: jsonb('fixes').$type<Readonly<Record<string, string>>>().notNull().default({}),
    /** Rows of one key make up one result: the text of the name's cell, set when rows are checked. */
    groupKey: text('group_key'),
  },
  (t) => [
    ...tenantRules('import_rows', t),
    within('import_rows_import', t.organisationId, t.importId, imports, 'cascade'),
    unique('import_rows_number_key').on(t.organisationId, t.importId, t.rowNumber),
    index('import_rows_verdict_idx').on(t.organisationId, t.importId, t.verdict, t.rowNumber),
    index('import_rows_group_idx').on(t.organisationId, t.importId, t.groupKey, t.rowNumber),
    check('import_rows_verdict_check', sql`${t.verdict} in ('accepted', 'cautioned', 'refused', 'skipped')`),
  ],
);
