import { sql } from 'drizzle-orm';
import { type AnyPgColumn, foreignKey, pgPolicy, primaryKey, uuid } from 'drizzle-orm/pg-core';
import { currentOrganisation, tenantRole } from './database-terms';
import { memberships, organisations } from './organisations';

/** The key of every tenant table. The organisation defaults to the transaction's own: inserts need not name it. */
export const tenantKey = () => ({
  organisationId: uuid('organisation_id').notNull().default(currentOrganisation),
  id: uuid('id').notNull().defaultRandom(),
});

interface TenantColumns {
  readonly organisationId: AnyPgColumn;
  readonly id: AnyPgColumn;
}

/** Primary key, organisation and the one row policy that every tenant table has. */
export const tenantRules = (table: string, t: TenantColumns) => [
  primaryKey({ name: `${table}_pkey`, columns: [t.organisationId, t.id] }),
  foreignKey({
    name: `${table}_organisation_fkey`,
    columns: [t.organisationId],
    foreignColumns: [organisations.id],
  }),
  pgPolicy(`${table}_tenant`, {
    for: 'all',
    to: tenantRole,
    using: sql`organisation_id = ${currentOrganisation}`,
    withCheck: sql`organisation_id = ${currentOrganisation}`,
  }),
];

/** A person's column refers to the membership, so that only people of the same organisation can stand in it. */
export const byMember = (
  table: string,
  organisationId: AnyPgColumn,
  userId: AnyPgColumn,
  suffix = 'member',
) =>
  foreignKey({
    name: `${table}_${suffix}_fkey`,
    columns: [organisationId, userId],
    foreignColumns: [memberships.organisationId, memberships.userId],
  });

/** A reference to another table of the same organisation. */
export const within = (
  name: string,
  organisationId: AnyPgColumn,
  column: AnyPgColumn,
  target: TenantColumns,
  onDelete: 'cascade' | 'no action' = 'no action',
) =>
  foreignKey({
    name: `${name}_fkey`,
    columns: [organisationId, column],
    foreignColumns: [target.organisationId, target.id],
  }).onDelete(onDelete);
