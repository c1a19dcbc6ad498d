import { sql } from 'drizzle-orm';
import { bigint, check, index, integer, jsonb, pgTable, text, unique, uuid } from 'drizzle-orm/pg-core';
import { byMember, tenantKey, tenantRules, within } from './columns';
import { bytea, instant } from './database-terms';
import { programmes } from './programmes';
import { jobs } from './work';

export const IMPORT_STATES = [
  'reading',
  'mapping',
  'checking',
  'ready',
  'storing',
  'stored',
  'withdrawn',
  'cancelled',
  'failed',
] as const;

/** One file on its way in: nothing of it counts until it is stored, and storing is one transaction. */
export const imports = pgTable(
  'imports',
  {
    ...tenantKey(),
    programmeId: uuid('programme_id').notNull(),
    fileName: text('file_name').notNull(),
    sha256: text('sha256').notNull(),
    sizeBytes: bigint('size_bytes', { mode: 'number' }).notNull(),
    encoding: text('encoding'),
    delimiter: text('delimiter'),
    decimal: text('decimal'),
    state: text('state', { enum: IMPORT_STATES }).notNull().default('reading'),
    /** The file as it came, kept until its rows are read. */
    content: bytea('content'),
    mapping: jsonb('mapping').$type<unknown>(),
    header: jsonb('header').$type<readonly string[]>(),
    options: jsonb('options').$type<unknown>(),
    summary: jsonb('summary').$type<unknown>(),
    rowCount: integer('row_count').notNull().default(0),
    progressRows: integer('progress_rows').notNull().default(0),
    failure: jsonb('failure').$type<unknown>(),
    jobId: uuid('job_id'),
    createdBy: uuid('created_by').notNull(),
    createdAt: instant('created_at').notNull().defaultNow(),
    updatedAt: instant('updated_at').notNull().defaultNow(),
    storedAt: instant('stored_at'),
    withdrawnAt: instant('withdrawn_at'),
    version: integer('version').notNull().default(1),
  },
  (t) => [
    ...tenantRules('imports', t),
    within('imports_programme', t.organisationId, t.programmeId, programmes),
    within('imports_job', t.organisationId, t.jobId, jobs),
    byMember('imports', t.organisationId, t.createdBy),
    index('imports_programme_idx').on(t.organisationId, t.programmeId, t.createdAt),
    index('imports_sha256_idx').on(t.organisationId, t.programmeId, t.sha256),
    check(
      'imports_state_check',
      sql`${t.state} in ('reading', 'mapping', 'checking', 'ready', 'storing', 'stored', 'withdrawn', 'cancelled', 'failed')`,
    ),
  ],
);

/** How columns of a file with this header were assigned the last time. */
export const importMappings = pgTable(
  'import_mappings',
  {
    ...tenantKey(),
    headerHash: text('header_hash').notNull(),
    mapping: jsonb('mapping').$type<unknown>().notNull(),
    updatedAt: instant('updated_at').notNull().defaultNow(),
  },
  (t) => [
    ...tenantRules('import_mappings', t),
    unique('import_mappings_header_key').on(t.organisationId, t.headerHash),
  ],
);
