import { sql } from 'drizzle-orm';
import { check, integer, pgTable, text, uuid } from 'drizzle-orm/pg-core';
import { ATTACHMENT_PURPOSES } from '#shared/contracts/attachments';
import { byMember, tenantKey, tenantRules } from './columns';
import { bytea, instant } from './database-terms';

export const attachments = pgTable(
  'attachments',
  {
    ...tenantKey(),
    /** A picture may be seen by whoever sees the variant, evidence by whoever sees results. */
    purpose: text('purpose', { enum: ATTACHMENT_PURPOSES }).notNull(),
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
    check('attachments_purpose_check', sql`${t.purpose} in ('picture', 'evidence')`),
    check('attachments_size_check', sql`octet_length(${t.content}) = ${t.bytes} and ${t.bytes} <= 10485760`),
  ],
);
