import { sql } from 'drizzle-orm';
import {
  bigint,
  boolean,
  check,
  foreignKey,
  index,
  integer,
  jsonb,
  pgPolicy,
  pgTable,
  primaryKey,
  text,
  timestamp,
  unique,
  uniqueIndex,
  uuid,
} from 'drizzle-orm/pg-core';
import { ORGANISATION_KINDS, ROLES } from '#shared/access/roles';
import { currentOrganisation, currentUser, instant, platformRole, tenantRole } from './database-terms';

/** Outside tenants: the list of tenants itself. A request sees its own row; the platform role looks them up. */
export const organisations = pgTable(
  'organisations',
  {
    id: uuid('id').primaryKey().defaultRandom(),
    kind: text('kind', { enum: ORGANISATION_KINDS }).notNull(),
    name: text('name').notNull(),
    slug: text('slug').notNull(),
    demo: boolean('demo').notNull().default(false),
    createdAt: instant('created_at').notNull().defaultNow(),
  },
  (t) => [
    unique('organisations_id_kind_key').on(t.id, t.kind),
    uniqueIndex('organisations_slug_key').on(sql`lower(${t.slug})`),
    check('organisations_kind_check', sql`${t.kind} in ('maker', 'supplier')`),
    pgPolicy('organisations_tenant', {
      for: 'select',
      to: tenantRole,
      using: sql`id = ${currentOrganisation}`,
    }),
    pgPolicy('organisations_platform', { for: 'select', to: platformRole, using: sql`true` }),
  ],
);

/** Outside tenants: people, who may belong to several organisations. Never readable by the tenant role. */
export const users = pgTable(
  'users',
  {
    id: uuid('id').primaryKey().defaultRandom(),
    email: text('email').notNull(),
    displayName: text('display_name').notNull(),
    passwordHash: text('password_hash'),
    demo: boolean('demo').notNull().default(false),
    /** What a demo person is there to do, shown beside "continue as". */
    task: text('task'),
    createdAt: instant('created_at').notNull().defaultNow(),
  },
  (t) => [uniqueIndex('users_email_key').on(sql`lower(${t.email})`)],
);

/** Outside tenants: how a person likes to see the product, in whichever organisation. */
export const userSettings = pgTable('user_settings', {
  userId: uuid('user_id')
    .primaryKey()
    .references(() => users.id),
  settings: jsonb('settings').$type<Readonly<Record<string, string>>>().notNull(),
});

/**
 * Who works where, as what. A tenant table; the platform role reads the rows of the one person who is signing in.
 * Name and address are copied, so that the tenant role never needs the table of all people.
 */
export const memberships = pgTable(
  'memberships',
  {
    organisationId: uuid('organisation_id').notNull().default(currentOrganisation),
    id: uuid('id').notNull().defaultRandom(),
    userId: uuid('user_id')
      .notNull()
      .references(() => users.id),
    organisationKind: text('organisation_kind', { enum: ORGANISATION_KINDS }).notNull(),
    role: text('role', { enum: ROLES as [(typeof ROLES)[number], ...(typeof ROLES)[number][]] }).notNull(),
    displayName: text('display_name').notNull(),
    email: text('email').notNull(),
    endedAt: instant('ended_at'),
    createdAt: instant('created_at').notNull().defaultNow(),
  },
  (t) => [
    primaryKey({ name: 'memberships_pkey', columns: [t.organisationId, t.id] }),
    unique('memberships_user_key').on(t.organisationId, t.userId),
    index('memberships_user_idx').on(t.userId),
    foreignKey({
      name: 'memberships_organisation_fkey',
      columns: [t.organisationId, t.organisationKind],
      foreignColumns: [organisations.id, organisations.kind],
    }),
    check(
      'memberships_role_check',
      sql`(${t.organisationKind} = 'maker' and ${t.role} in ('administrator', 'programme-manager', 'aerodynamicist', 'stylist', 'viewer'))
        or (${t.organisationKind} = 'supplier' and ${t.role} in ('supplier-administrator', 'supplier-engineer'))`,
    ),
    pgPolicy('memberships_tenant', {
      for: 'all',
      to: tenantRole,
      using: sql`organisation_id = ${currentOrganisation}`,
      withCheck: sql`organisation_id = ${currentOrganisation}`,
    }),
    pgPolicy('memberships_platform', {
      for: 'select',
      to: platformRole,
      using: sql`user_id = ${currentUser}`,
    }),
  ],
);

/** Outside tenants: one-time links by which a person sets a password. Only the hash of the token is kept. */
export const passwordTokens = pgTable('password_tokens', {
  tokenHash: text('token_hash').primaryKey(),
  userId: uuid('user_id')
    .notNull()
    .references(() => users.id),
  expiresAt: instant('expires_at').notNull(),
  usedAt: instant('used_at'),
});

/** Outside tenants: sessions as connect-pg-simple keeps them. */
export const webSessions = pgTable(
  'web_sessions',
  {
    sid: text('sid').primaryKey(),
    sess: jsonb('sess').notNull(),
    expire: timestamp('expire', { precision: 6 }).notNull(),
  },
  (t) => [index('web_sessions_expire_idx').on(t.expire)],
);

/** Outside tenants: sign-in attempts as rate-limiter-flexible counts them. */
export const signInLimits = pgTable('sign_in_limits', {
  key: text('key').primaryKey(),
  points: integer('points').notNull().default(0),
  expire: bigint('expire', { mode: 'number' }),
});
