import { sql } from 'drizzle-orm';
import { check, integer, pgTable, text, uuid } from 'drizzle-orm/pg-core';
import { byMember, tenantKey, tenantRules } from './columns';
import { bytea, instant } from './database-terms';

/** The largest attachment that is kept, in bytes (10 MB). */
export const ATTACHMENT_LIMIT_BYTES = 10 * 1024 * 1024;

export const attachments = pgTable(
  'attachments',
  {
    ...tenantKey(),
    fileName: text('file_name').notNull(),
    mediaType: text('media_type').notNull(),
    bytes: integer('bytes').notNull(),
    sha256: text('sha256').notNull(),
    content: bytea('content').notNull(),
    createdBy: uuid('created_by'),
    createdAt: instant('created_at').notNull().defaultNow(),
  },
  (t) => [
    ...tenantRules('attachments', t),
    byMember('attachments', t.organisationId, t.createdBy),
    check('attachments_size_check', sql`octet_length(${t.content}) = ${t.bytes} and ${t.bytes} <= 10485760`),
  ],
);
