import { sql } from 'drizzle-orm';
import {
  bigint,
  check,
  doublePrecision,
  index,
  integer,
  jsonb,
  pgTable,
  text,
  unique,
  uuid,
} from 'drizzle-orm/pg-core';
import { byMember, tenantKey, tenantRules } from './columns';
import { instant } from './database-terms';

/** One differing field of an audited change. */
export interface Difference {
  readonly field: string;
  readonly before?: unknown;
  readonly after?: unknown;
}

/** Who changed what: written in the transaction of the change, never altered. */
export const auditEvents = pgTable(
  'audit_events',
  {
    ...tenantKey(),
    at: instant('at')
      .notNull()
      .default(sql`clock_timestamp()`),
    actorUserId: uuid('actor_user_id'),
    action: text('action').notNull(),
    entityKind: text('entity_kind').notNull(),
    entityId: uuid('entity_id'),
    summary: jsonb('summary').$type<readonly Difference[]>().notNull(),
    requestId: text('request_id'),
  },
  (t) => [
    ...tenantRules('audit_events', t),
    byMember('audit_events', t.organisationId, t.actorUserId, 'actor'),
    index('audit_events_at_idx').on(t.organisationId, t.at),
    index('audit_events_entity_idx').on(t.organisationId, t.entityId),
  ],
);

/** Commands that were carried out, with the answer given: the same key again gets the same answer. */
export const commands = pgTable(
  'commands',
  {
    ...tenantKey(),
    userId: uuid('user_id').notNull(),
    key: text('key').notNull(),
    bodyHash: text('body_hash').notNull(),
    status: integer('status').notNull(),
    response: jsonb('response').$type<unknown>(),
    createdAt: instant('created_at').notNull().defaultNow(),
  },
  (t) => [
    ...tenantRules('commands', t),
    byMember('commands', t.organisationId, t.userId),
    unique('commands_key_key').on(t.organisationId, t.userId, t.key),
  ],
);

export const JOB_STATES = ['queued', 'running', 'done', 'failed', 'cancelled'] as const;

/** Long work with progress that survives a reload and a restart. */
export const jobs = pgTable(
  'jobs',
  {
    ...tenantKey(),
    kind: text('kind').notNull(),
    state: text('state', { enum: JOB_STATES }).notNull().default('queued'),
    progress: doublePrecision('progress').notNull().default(0),
    total: doublePrecision('total'),
    message: text('message'),
    payload: jsonb('payload').$type<unknown>().notNull(),
    cancelRequestedAt: instant('cancel_requested_at'),
    leaseUntil: instant('lease_until'),
    attempts: integer('attempts').notNull().default(0),
    createdBy: uuid('created_by'),
    createdAt: instant('created_at').notNull().defaultNow(),
    startedAt: instant('started_at'),
    finishedAt: instant('finished_at'),
  },
  (t) => [
    ...tenantRules('jobs', t),
    byMember('jobs', t.organisationId, t.createdBy),
    index('jobs_state_idx').on(t.organisationId, t.state, t.createdAt),
    check('jobs_state_check', sql`${t.state} in ('queued', 'running', 'done', 'failed', 'cancelled')`),
  ],
);

export const OUTBOX_STATES = ['waiting', 'sent', 'failed'] as const;

/** Messages that leave after the commit that caused them; one per event, recipient and channel. */
export const outbox = pgTable(
  'outbox',
  {
    ...tenantKey(),
    event: text('event').notNull(),
    recipientUserId: uuid('recipient_user_id').notNull(),
    channel: text('channel').notNull(),
    state: text('state', { enum: OUTBOX_STATES }).notNull().default('waiting'),
    payload: jsonb('payload').$type<unknown>().notNull(),
    leaseUntil: instant('lease_until'),
    attempts: integer('attempts').notNull().default(0),
    messageId: text('message_id').notNull(),
    createdAt: instant('created_at').notNull().defaultNow(),
    sentAt: instant('sent_at'),
  },
  (t) => [
    ...tenantRules('outbox', t),
    byMember('outbox', t.organisationId, t.recipientUserId, 'recipient'),
    unique('outbox_event_key').on(t.organisationId, t.event, t.recipientUserId, t.channel),
    check('outbox_state_check', sql`${t.state} in ('waiting', 'sent', 'failed')`),
  ],
);

/** Running numbers, one series per organisation: a database sequence would tell one tenant how busy the others are. */
export const counters = pgTable(
  'counters',
  {
    ...tenantKey(),
    series: text('series').notNull(),
    value: bigint('value', { mode: 'number' }).notNull(),
  },
  (t) => [...tenantRules('counters', t), unique('counters_series_key').on(t.organisationId, t.series)],
);
